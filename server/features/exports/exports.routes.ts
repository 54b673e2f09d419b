import { Router, type RequestHandler } from 'express';
import { route } from '#server/http/route.ts';
import { exportEntries } from '#shared/contracts/entry-search.ts';
import type { ExportsService } from './exports.service.ts';

const media = { zip: 'application/zip', csv: 'text/csv; charset=utf-8', bib: 'application/x-bibtex; charset=utf-8' } as const;
const fileName = { zip: 'sillstone-export.zip', csv: 'parameters.csv', bib: 'references.bib' } as const;

export function exportsRoutes(exports: ExportsService, exportLimit: RequestHandler): Router {
  const router = Router();
  router.use(exportEntries.path, exportLimit);
  route(router, exportEntries, async ({ actor, query, res }) => {
    try {
      await exports.write(actor, query, res, () => {
        res.setHeader('Content-Type', media[query.format]);
        res.setHeader('Content-Disposition', `attachment; filename="${fileName[query.format]}"`);
        res.setHeader('Cache-Control', 'no-store');
      });
    } catch (error) {
      // A reader who went away before the first byte needs no answer, and is no failure of ours.
      if (res.destroyed) return;
      // Once bytes have gone out, breaking the connection is the only way to say that the file is not whole.
      if (!res.headersSent) throw error;
      res.destroy(error instanceof Error ? error : undefined);
    }
  });
  return router;
}
