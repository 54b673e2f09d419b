import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import {
  addToCollection, changeCollection, createCollection, discardCollection, getCollection, listCollections, removeFromCollection, restoreCollection, type CollectionDetail,
} from '#shared/contracts/collections.ts';
import { call } from '#client/lib/api-client.ts';

/** The reader's own collections. */
export const collectionsOptions = queryOptions({
  queryKey: ['collections', 'list'],
  queryFn: ({ signal }) => call(listCollections, { signal }),
});

/** One collection with what it holds. */
export const collectionOptions = (id: string) => queryOptions({
  queryKey: ['collections', 'one', id],
  queryFn: ({ signal }) => call(getCollection, { params: { id }, signal }),
});

/** The most entries one request may name. */
const atOnce = 500;

async function inParts<T>(accessions: readonly string[], send: (part: string[]) => Promise<T>): Promise<T[]> {
  const answers: T[] = [];
  for (let from = 0; from < accessions.length; from += atOnce) answers.push(await send(accessions.slice(from, from + atOnce)));
  return answers;
}

/** Every change of a collection; lists and pages that show it hear of it. */
export function useCollectionChanges() {
  const client = useQueryClient();
  const changed = async (collection?: CollectionDetail) => {
    if (collection) client.setQueryData(collectionOptions(collection.id).queryKey, collection);
    await Promise.all([client.invalidateQueries({ queryKey: ['collections'] }), client.invalidateQueries({ queryKey: ['entries', 'search'] })]);
  };
  return {
    create: useMutation({
      mutationFn: async ({ name, accessions }: { name: string; accessions: readonly string[] }) => {
        const first = accessions.slice(0, atOnce);
        const made = await call(createCollection, { body: { name, ...(first.length > 0 ? { accessions: first } : {}) } });
        const rest = await inParts(accessions.slice(atOnce), (part) => call(addToCollection, { params: { id: made.id }, body: { accessions: part } }));
        return rest.at(-1)?.collection ?? made;
      },
      onSuccess: changed,
    }),
    add: useMutation({
      mutationFn: async ({ id, accessions }: { id: string; accessions: readonly string[] }) => {
        const answers = await inParts(accessions, (part) => call(addToCollection, { params: { id }, body: { accessions: part } }));
        return { added: answers.reduce((sum, { added }) => sum + added, 0), collection: answers.at(-1)?.collection };
      },
      onSuccess: ({ collection }) => changed(collection),
    }),
    remove: useMutation({
      mutationFn: ({ id, accessions }: { id: string; accessions: readonly string[] }) => inParts(accessions, (part) => call(removeFromCollection, { params: { id }, body: { accessions: part } })),
      onSuccess: (answers) => changed(answers.at(-1)?.collection),
    }),
    rename: useMutation({
      mutationFn: ({ id, name, description }: { id: string; name: string; description: string }) => call(changeCollection, { params: { id }, body: { name, description } }),
      onSuccess: changed,
    }),
    discard: useMutation({ mutationFn: (id: string) => call(discardCollection, { params: { id } }), onSuccess: () => changed() }),
    restore: useMutation({ mutationFn: (id: string) => call(restoreCollection, { params: { id } }), onSuccess: changed }),
  };
}
