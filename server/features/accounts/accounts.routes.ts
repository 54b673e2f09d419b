import { Router, type RequestHandler } from 'express';
import type { Actor } from '#server/actor.ts';
import type { Context } from '#server/context.ts';
import type { ReviewsService } from '#server/features/reviews/reviews.service.ts';
import type { CsrfProtection } from '#server/http/csrf.ts';
import { actorOf, route } from '#server/http/route.ts';
import { endSession, startSession } from '#server/http/session.ts';
import * as contract from '#shared/contracts/accounts.ts';
import { hasRole, type Role } from '#shared/domain/roles.ts';
import { demonstrationPassword, type AccountsService } from './accounts.service.ts';

interface Parts {
  context: Context;
  accounts: AccountsService;
  reviews: Pick<ReviewsService, 'countWaiting'>;
  csrf: CsrfProtection;
  signInLimit: RequestHandler;
}

export function accountsRoutes({ context, accounts, reviews, csrf, signInLimit }: Parts): Router {
  const router = Router();

  async function me(actor: Actor): Promise<contract.Me> {
    return {
      user: actor.userId ? { id: actor.userId, name: actor.name, roles: actor.roles.filter((role): role is Exclude<Role, 'visitor'> => role !== 'visitor') } : null,
      preferences: await accounts.preferences(actor),
      reviewsWaiting: hasRole(actor.roles, 'reviewer') ? await reviews.countWaiting() : null,
      demonstration: context.demonstration,
      version: context.version,
    };
  }

  route(router, contract.getMe, ({ actor }) => me(actor));
  route(router, contract.getCsrf, ({ req, res }) => {
    res.setHeader('Cache-Control', 'no-store');
    return { token: csrf.issue(req, res) };
  });
  router.use(contract.signIn.path, signInLimit);
  route(router, contract.signIn, async ({ body, req, res }) => {
    const actor = await accounts.signIn(body.email, body.password);
    await startSession(req, actor.userId);
    res.setHeader('X-CSRF-Token', csrf.issue(req, res));
    return me(actor);
  });
  route(router, contract.signOut, async ({ req, res }) => {
    await endSession(req, res);
    res.locals.actor = undefined;
    return me(actorOf(res));
  });
  route(router, contract.patchPreferences, ({ actor, body }) => accounts.changePreferences(actor, body));
  route(router, contract.demoAccounts, async () => ({
    accounts: await accounts.demonstrationAccounts(),
    password: context.demonstration ? demonstrationPassword : null,
  }));
  return router;
}
