import { Router } from 'express';
import { route } from '#server/http/route.ts';
import * as contract from '#shared/contracts/entry-search.ts';
import type { SearchService } from './search.service.ts';

export function searchRoutes(search: SearchService): Router {
  const router = Router();
  route(router, contract.searchEntries, ({ actor, query }) => search.search(actor, query));
  route(router, contract.summariseEntries, ({ actor, query }) => search.summarise(actor, query));
  route(router, contract.groupEntries, ({ actor, query }) => search.groups(actor, query));
  return router;
}
