import * as z from 'zod';
import { states } from '../domain/states.ts';
import { endpoint } from './endpoint.ts';

/** Limits that keep one person's lists within reason. */
export const mostCollections = 200;
export const mostCollected = 5000;

const name = z.string().trim().min(1, 'Give the collection a name.').max(120);
const description = z.string().trim().max(1000);
const params = z.object({ id: z.string().max(60) });
const accessions = z.array(z.string().max(20)).min(1).max(500);

export const collectionSummary = z.object({
  id: z.string(),
  name: z.string(),
  description: z.string(),
  entries: z.int(),
  changedAt: z.string(),
});
export type CollectionSummary = z.infer<typeof collectionSummary>;

/** An entry of a collection with the state of its newest public version: one that is retracted stays in the list and says so. */
export const collectedEntry = z.object({ accession: z.string(), state: z.enum(states), addedAt: z.string() });

export const collectionDetail = collectionSummary.extend({
  createdAt: z.string(),
  /** In the order they were added. */
  items: z.array(collectedEntry),
});
export type CollectionDetail = z.infer<typeof collectionDetail>;

export const listCollections = endpoint({
  method: 'GET', path: '/collections', access: 'reader', summary: 'Your collections, the one changed last first',
  response: z.object({ items: z.array(collectionSummary), total: z.int(), totalIsExact: z.boolean(), nextCursor: z.string().nullable() }),
});

export const createCollection = endpoint({
  method: 'POST', path: '/collections', access: 'reader', summary: 'Start a collection, with entries or empty',
  body: z.object({ name, description: description.default(''), accessions: accessions.optional() }), response: collectionDetail,
});

export const getCollection = endpoint({ method: 'GET', path: '/collections/:id', access: 'reader', summary: 'One of your collections', params, response: collectionDetail });

export const changeCollection = endpoint({
  method: 'PATCH', path: '/collections/:id', access: 'reader', summary: 'Rename or describe a collection', params,
  body: z.object({ name: name.optional(), description: description.optional() }), response: collectionDetail,
});

export const addToCollection = endpoint({
  method: 'POST', path: '/collections/:id/entries', access: 'reader', summary: 'Add entries to a collection', params, body: z.object({ accessions }),
  response: z.object({ added: z.int(), already: z.int(), collection: collectionDetail }),
});

export const removeFromCollection = endpoint({
  method: 'POST', path: '/collections/:id/entries/remove', access: 'reader', summary: 'Take entries out of a collection', params, body: z.object({ accessions }),
  response: z.object({ removed: z.int(), collection: collectionDetail }),
});

export const discardCollection = endpoint({ method: 'POST', path: '/collections/:id/discard', access: 'reader', summary: 'Discard a collection; it can be restored', params });

export const restoreCollection = endpoint({
  method: 'POST', path: '/collections/:id/restore', access: 'reader', summary: 'Bring a discarded collection back', params, response: collectionDetail,
});
