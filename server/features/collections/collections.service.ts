import { requireRole, type Actor, type SignedIn } from '#server/actor.ts';
import type { Context } from '#server/context.ts';
import { appendEvents } from '#server/db/event-log.ts';
import type { DbOrTx, Tx } from '#server/db/pool.ts';
import { notFound, Refusal } from '#server/refusal.ts';
import { mostCollected, mostCollections, type CollectionDetail, type CollectionSummary } from '#shared/contracts/collections.ts';
import { readAccession } from '#shared/domain/accession.ts';
import type { State } from '#shared/domain/states.ts';
import * as repository from './collections.repository.ts';

const isId = (text: string): boolean => /^[0-9a-f]{8}(?:-[0-9a-f]{4}){3}-[0-9a-f]{12}$/i.test(text);

/** Accessions of the entries in the collections named, as far as they are the actor's own; nothing of anybody else's. */
export async function accessionsCollected(db: DbOrTx, actor: Actor, ids: readonly string[]): Promise<string[]> {
  const own = ids.filter(isId);
  return actor.userId === null || own.length === 0 ? [] : repository.listAccessions(db, actor.userId, own);
}

/** A reader's own lists of entries. A list of somebody else does not exist for anybody but its owner. */
export function createCollectionsService({ db, clock }: Context) {
  const missing = () => notFound('This collection');

  async function find(actor: SignedIn, id: string, from: DbOrTx = db, lock = false): Promise<repository.CollectionRow> {
    const row = isId(id) ? await repository.findCollection(from, actor.userId, id, lock) : null;
    if (!row) throw missing();
    return row;
  }

  async function kept(actor: SignedIn, id: string, from: DbOrTx = db, lock = false): Promise<repository.CollectionRow> {
    const row = await find(actor, id, from, lock);
    if (row.discardedAt) throw missing();
    return row;
  }

  async function detail(from: DbOrTx, row: repository.CollectionRow): Promise<CollectionDetail> {
    const items = await repository.listEntries(from, row.id);
    return {
      id: row.id, name: row.name, description: row.description, entries: items.length, createdAt: row.createdAt.toISOString(), changedAt: row.changedAt.toISOString(),
      items: items.map(({ accession, state, addedAt }) => ({ accession, state: state as State, addedAt: addedAt.toISOString() })),
    };
  }

  /** The entries behind accessions; refuses, naming each, what is no public entry. */
  async function entriesOf(from: DbOrTx, typed: readonly string[]): Promise<string[]> {
    const read = typed.map((text) => ({ text, accession: readAccession(text) }));
    const known = await repository.findPublicEntries(from, read.flatMap(({ accession }) => (accession ? [accession] : [])));
    const errors = read.flatMap(({ text, accession }, i) => (accession && known.has(accession) ? [] : [{ path: `accessions.${i}`, message: `There is no public entry ${text}.` }]));
    if (errors.length > 0) throw new Refusal('invalid-input', errors[0]?.message, { errors });
    return [...new Set(read.map(({ accession }) => known.get(accession ?? '') ?? ''))];
  }

  async function requireRoom(tx: Tx, actor: SignedIn): Promise<void> {
    if (await repository.countCollections(tx, actor.userId) < mostCollections) return;
    throw new Refusal('invalid-input', `You have ${mostCollections} collections, which is as many as one person can have. Discard one first.`);
  }

  async function add(tx: Tx, row: repository.CollectionRow, entryIds: readonly string[], at: Date): Promise<number> {
    const added = await repository.insertEntries(tx, row.id, entryIds, at);
    const total = await repository.countEntries(tx, row.id);
    if (total > mostCollected) {
      const message = `A collection holds at most ${mostCollected} entries; with these it would hold ${total}.`;
      throw new Refusal('invalid-input', message, { errors: [{ path: 'accessions', message }] });
    }
    return added;
  }

  /** Changes a collection that nobody else can change meanwhile, and writes down that it was. */
  async function change<T>(actor: SignedIn, id: string, action: string, work: (tx: Tx, row: repository.CollectionRow, at: Date) => Promise<T>, of = kept) {
    return db.transaction(async (tx) => {
      const at = clock();
      const row = await of(actor, id, tx, true);
      const result = await work(tx, row, at);
      await repository.updateCollection(tx, row.id, { changedAt: at });
      const collection = await detail(tx, await find(actor, id, tx));
      await appendEvents(tx, [{ at, actorId: actor.userId, action: `collection.${action}`, subjectType: 'collection', subjectId: row.id }]);
      return { result, collection };
    });
  }

  return {
    async list(who: Actor): Promise<CollectionSummary[]> {
      const rows = await repository.listCollections(db, requireRole(who, 'reader').userId);
      return rows.map((row) => ({ ...row, changedAt: row.changedAt.toISOString() }));
    },

    async get(who: Actor, id: string): Promise<CollectionDetail> {
      return detail(db, await kept(requireRole(who, 'reader'), id));
    },

    /** Starts a collection. @throws Refusal when there are too many, or an entry is not public. */
    async create(who: Actor, { name, description, accessions = [] }: { name: string; description: string; accessions?: string[] | undefined }): Promise<CollectionDetail> {
      const actor = requireRole(who, 'reader');
      return db.transaction(async (tx) => {
        const at = clock();
        await requireRoom(tx, actor);
        const entryIds = accessions.length > 0 ? await entriesOf(tx, accessions) : [];
        const row = await repository.insertCollection(tx, { ownerId: actor.userId, name, description, at });
        if (entryIds.length > 0) await add(tx, row, entryIds, at);
        const collection = await detail(tx, row);
        await appendEvents(tx, [{ at, actorId: actor.userId, action: 'collection.created', subjectType: 'collection', subjectId: row.id, payload: { entries: entryIds.length } }]);
        return collection;
      });
    },

    async rename(who: Actor, id: string, { name, description }: { name?: string | undefined; description?: string | undefined }): Promise<CollectionDetail> {
      const { collection } = await change(requireRole(who, 'reader'), id, 'renamed', (tx, row) =>
        repository.updateCollection(tx, row.id, { name: name ?? row.name, description: description ?? row.description }));
      return collection;
    },

    async addEntries(who: Actor, id: string, accessions: readonly string[]) {
      const { result, collection } = await change(requireRole(who, 'reader'), id, 'added', async (tx, row, at) => {
        const entryIds = await entriesOf(tx, accessions);
        const added = await add(tx, row, entryIds, at);
        return { added, already: entryIds.length - added };
      });
      return { ...result, collection };
    },

    async removeEntries(who: Actor, id: string, accessions: readonly string[]) {
      const { result, collection } = await change(requireRole(who, 'reader'), id, 'removed', async (tx, row) =>
        repository.deleteEntries(tx, row.id, await entriesOf(tx, accessions)));
      return { removed: result, collection };
    },

    async discard(who: Actor, id: string): Promise<void> {
      await change(requireRole(who, 'reader'), id, 'discarded', (tx, row, at) => repository.updateCollection(tx, row.id, { discardedAt: at }));
    },

    async restore(who: Actor, id: string): Promise<CollectionDetail> {
      const actor = requireRole(who, 'reader');
      const { collection } = await change(actor, id, 'restored', async (tx, row) => {
        if (row.discardedAt) await requireRoom(tx, actor);
        await repository.updateCollection(tx, row.id, { discardedAt: null });
      }, find);
      return collection;
    },
  };
}
export type CollectionsService = ReturnType<typeof createCollectionsService>;
