import { Router } from 'express';
import type { Context } from '#server/context.ts';
import { databaseAnswers } from '#server/db/ping.ts';
import { route } from '#server/http/route.ts';
import * as contract from '#shared/contracts/service.ts';

export function healthRoutes({ db, version }: Context): Router {
  const router = Router();
  route(router, contract.getHealth, async ({ res }) => {
    const answers = await databaseAnswers(db);
    res.status(answers ? 200 : 503).setHeader('Cache-Control', 'no-store');
    return { status: answers ? 'ok' as const : 'degraded' as const, database: answers ? 'ok' as const : 'unavailable' as const, version };
  });
  route(router, contract.getReady, async ({ res }) => {
    const ready = await databaseAnswers(db);
    res.status(ready ? 200 : 503).setHeader('Cache-Control', 'no-store');
    return { ready };
  });
  return router;
}
