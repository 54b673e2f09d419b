import { Router } from 'express';
import type { EntriesService } from '#server/features/entries/entries.service.ts';
import { route } from '#server/http/route.ts';
import * as contract from '#shared/contracts/sources.ts';
import type { SourcesService } from './sources.service.ts';

export function sourcesRoutes(sources: SourcesService, entries: Pick<EntriesService, 'listOfSource'>): Router {
  const router = Router();
  route(router, contract.listSources, ({ actor, query }) => sources.list(actor, query));
  route(router, contract.getSource, ({ actor, params }) => sources.get(actor, params.id));
  route(router, contract.lookUpDoi, async ({ actor, params }) => {
    const found = await sources.lookUp(Array.isArray(params.doi) ? params.doi.join('/') : params.doi);
    return { ...found, entries: found.source ? await entries.listOfSource(actor, found.source.id) : [] };
  });
  return router;
}
