import { Router } from 'express';
import { route } from '#server/http/route.ts';
import * as contract from '#shared/contracts/collections.ts';
import type { CollectionsService } from './collections.service.ts';

export function collectionsRoutes(collections: CollectionsService): Router {
  const router = Router();
  route(router, contract.listCollections, async ({ actor }) => {
    const items = await collections.list(actor);
    return { items, total: items.length, totalIsExact: true, nextCursor: null };
  });
  route(router, contract.createCollection, async ({ actor, body, res }) => {
    const collection = await collections.create(actor, body);
    res.status(201);
    return collection;
  });
  route(router, contract.getCollection, ({ actor, params }) => collections.get(actor, params.id));
  route(router, contract.changeCollection, ({ actor, params, body }) => collections.rename(actor, params.id, body));
  route(router, contract.addToCollection, ({ actor, params, body }) => collections.addEntries(actor, params.id, body.accessions));
  route(router, contract.removeFromCollection, ({ actor, params, body }) => collections.removeEntries(actor, params.id, body.accessions));
  route(router, contract.discardCollection, async ({ actor, params, res }) => {
    await collections.discard(actor, params.id);
    res.status(204).end();
  });
  route(router, contract.restoreCollection, ({ actor, params }) => collections.restore(actor, params.id));
  return router;
}
