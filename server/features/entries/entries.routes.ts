import { Router, type Request } from 'express';
import { Refusal } from '#server/refusal.ts';
import type { PageHead } from '#server/http/page-head.ts';
import { route } from '#server/http/route.ts';
import * as contract from '#shared/contracts/entries.ts';
import type { EntriesService } from './entries.service.ts';

/** The tag in If-Match, without its quotes; null when the header is absent. */
function seenTag(req: Request): string | null {
  const header = req.headers['if-match'];
  if (header === undefined) return null;
  const tag = /^"([^"]+)"$/.exec(header.trim())?.[1];
  if (!tag) throw new Refusal('bad-request', 'If-Match must be one strong ETag, such as "1.3".');
  return tag;
}

const editTag = (entry: contract.EntryForEditing) => `"${entry.revision}.${entry.lock}"`;

/** The heads of the pages of entries; of other pages it knows nothing. */
export const describePages = (entries: EntriesService) => async (pathname: string): Promise<PageHead | null> => {
  const [, accession, version] = /^\/entries\/([^/]{1,40})(?:\/v\/(\d{1,6}))?\/?$/.exec(pathname) ?? [];
  return accession === undefined ? null : entries.pageHead(accession, version === undefined ? null : Number(version));
};

export function entriesRoutes(entries: EntriesService): Router {
  const router = Router();
  route(router, contract.createEntry, async ({ actor, body, res }) => {
    const entry = await entries.create(actor, body);
    res.status(201).setHeader('ETag', editTag(entry)).setHeader('Location', `/api/v1/entries/${entry.accession}`);
    return entry;
  });
  route(router, contract.previewEntry, ({ actor, body, query }) => entries.preview(actor, body, query.T ?? null));
  // Its ETag is made from the whole answer: neighbours and history change without the revision.
  route(router, contract.getEntry, ({ actor, params, query }) => entries.get(actor, params.accession, query.T ?? null));
  route(router, contract.listEntryVersions, async ({ actor, params }) => ({ items: await entries.versions(actor, params.accession) }));
  route(router, contract.getEntryVersion, ({ actor, params, query }) => entries.getVersion(actor, params.accession, params.version, query.T ?? null));
  route(router, contract.getEntryChanges, ({ actor, params, query }) => entries.changes(actor, params.accession, query));
  route(router, contract.getDraft, async ({ actor, params, res }) => {
    const entry = await entries.draft(actor, params.accession);
    res.setHeader('ETag', editTag(entry));
    return entry;
  });
  route(router, contract.patchEntry, async ({ actor, params, body, req, res }) => {
    const entry = await entries.patch(actor, params.accession, body, seenTag(req));
    res.setHeader('ETag', editTag(entry));
    return entry;
  });
  route(router, contract.submitEntry, async ({ actor, params, req, res }) => {
    const entry = await entries.submit(actor, params.accession, seenTag(req));
    res.setHeader('ETag', editTag(entry));
    return entry;
  });
  route(router, contract.withdrawEntry, ({ actor, params }) => entries.withdraw(actor, params.accession));
  route(router, contract.reviseEntry, async ({ actor, params, body, res }) => {
    const entry = await entries.revise(actor, params.accession, body.reason);
    res.status(201).setHeader('ETag', editTag(entry));
    return entry;
  });
  route(router, contract.retractEntry, ({ actor, params, body }) => entries.retract(actor, params.accession, body.reason));
  route(router, contract.listMyEntries, ({ actor, query }) => entries.listMine(actor, query));
  return router;
}
