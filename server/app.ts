import compression from 'compression';
import cookieParser from 'cookie-parser';
import express, { type Express } from 'express';
import helmet from 'helmet';
import type { Context } from './context.ts';
import { accountsRoutes } from './features/accounts/accounts.routes.ts';
import { calculatorsRoutes } from './features/calculators/calculators.routes.ts';
import { collectionsRoutes } from './features/collections/collections.routes.ts';
import { describePages, entriesRoutes } from './features/entries/entries.routes.ts';
import { exportsRoutes } from './features/exports/exports.routes.ts';
import { healthRoutes } from './features/health/health.routes.ts';
import { reviewsRoutes } from './features/reviews/reviews.routes.ts';
import { searchRoutes } from './features/search/search.routes.ts';
import { sourcesRoutes } from './features/sources/sources.routes.ts';
import { vocabularyRoutes } from './features/vocabulary/vocabulary.routes.ts';
import { csrfProtection } from './http/csrf.ts';
import { problemHandler } from './http/problem.ts';
import { limit, type Limit } from './http/rate-limit.ts';
import { requestId } from './http/request-id.ts';
import { actorMiddleware, sessionMiddleware } from './http/session.ts';
import { staticFiles } from './http/static-files.ts';
import { Refusal } from './refusal.ts';
import type { Services } from './services.ts';

export interface HttpSettings {
  sessionSecret: string;
  /** Cookies are for https only. */
  secureCookies: boolean;
  clientDir: string;
  limits: { signInFailures: Limit; calculators: Limit; exports: Limit };
}

export const usualLimits: HttpSettings['limits'] = {
  signInFailures: { perWindow: 20, windowS: 900 },
  calculators: { perWindow: 600, windowS: 60 },
  exports: { perWindow: 60, windowS: 60 },
};

/** Puts the middleware and the routes in their order. */
export function createApp(context: Context, services: Services, settings: HttpSettings): Express {
  const { db, log } = context;
  const pool = db.$client;
  const app = express();
  app.disable('x-powered-by');
  app.set('query parser', 'simple');
  // The TLS proxy in front runs on this machine or in its private network; only such a peer is believed about the client's address and protocol.
  app.set('trust proxy', ['loopback', 'uniquelocal']);
  app.use(requestId);
  app.use(helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: ["'self'"], scriptSrc: ["'self'"], styleSrc: ["'self'"], styleSrcAttr: ["'unsafe-inline'"], fontSrc: ["'self'"], connectSrc: ["'self'"],
        imgSrc: ["'self'", 'data:', 'blob:'], objectSrc: ["'none'"], frameAncestors: ["'none'"], baseUri: ["'self'"], formAction: ["'self'"],
        upgradeInsecureRequests: settings.secureCookies ? [] : null,
      },
    },
    strictTransportSecurity: settings.secureCookies,
  }));
  app.use(compression());
  if (context.demonstration) {
    app.use((_req, res, next) => {
      res.setHeader('X-Robots-Tag', 'noindex');
      next();
    });
  }

  const { assets, page } = staticFiles(settings.clientDir, { demonstration: context.demonstration, describe: describePages(services.entries) });
  const api = express.Router();
  const csrf = csrfProtection(settings.sessionSecret, settings.secureCookies);
  api.use(healthRoutes(context));
  api.use(sessionMiddleware(pool, settings.sessionSecret, settings.secureCookies), cookieParser());
  api.use(actorMiddleware(services.accounts.findActor));
  api.use(express.json({ limit: '1mb', type: ['application/json', 'application/merge-patch+json'] }));
  api.use(csrf.guard((path) => path.startsWith('/calc/') || path === '/entries/preview'));
  api.use(accountsRoutes({ context, accounts: services.accounts, reviews: services.reviews, csrf, signInLimit: limit(pool, 'sign-in', settings.limits.signInFailures, { failuresOnly: true }) }));
  api.use(vocabularyRoutes(services.vocabulary));
  api.use(sourcesRoutes(services.sources, services.entries));
  api.use(exportsRoutes(services.exports, limit(pool, 'export', settings.limits.exports)));
  api.use(searchRoutes(services.search));
  api.use(entriesRoutes(services.entries));
  api.use(reviewsRoutes(services.reviews));
  api.use(collectionsRoutes(services.collections));
  api.use(calculatorsRoutes(services.sources, limit(pool, 'calculator', settings.limits.calculators)));
  api.use((_req, _res, next) => next(new Refusal('not-found', 'There is no such address in this interface.')));
  app.use('/api/v1', api);
  app.use('/api', (_req, _res, next) => next(new Refusal('not-found', 'There is no such address. The interface is under /api/v1.')));

  app.use(assets);
  app.use('/{*path}', page);
  app.use(problemHandler(log));
  return app;
}
