import type { Request, Response, Router } from 'express';
import type * as z from 'zod';
import { requireRole, visitor, type Actor } from '#server/actor.ts';
import { Refusal } from '#server/refusal.ts';
import type { BodyOf, Endpoint, ParamsOf, QueryOf, ResponseOf } from '#shared/contracts/endpoint.ts';

export interface Call<E> {
  params: ParamsOf<E>;
  query: QueryOf<E>;
  body: BodyOf<E>;
  actor: Actor;
  req: Request;
  res: Response;
}

/** Who the request comes from, as the session middleware found out. */
export function actorOf(res: Response): Actor {
  return (res.locals.actor as Actor | undefined) ?? visitor;
}

/**
 * Mounts an endpoint: checks the role the contract asks for, parses the request once, calls the handler and sends what it returns.
 * A handler of an endpoint without a response schema answers by itself.
 */
export function route<P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType, R extends z.ZodType>(
  router: Router,
  endpoint: Endpoint<P, Q, B, R>,
  handler: (call: Call<Endpoint<P, Q, B, R>>) => Promise<ResponseOf<Endpoint<P, Q, B, R>> | void> | ResponseOf<Endpoint<P, Q, B, R>> | void,
): void {
  const method = endpoint.method.toLowerCase() as 'get' | 'post' | 'patch' | 'delete';
  router[method](endpoint.path, async (req: Request, res: Response) => {
    const actor = actorOf(res);
    if (endpoint.access !== 'visitor') requireRole(actor, endpoint.access);
    // A body that was sent but is not JSON must not pass for an empty one.
    if (endpoint.body && req.body === undefined && (Number(req.headers['content-length'] ?? '0') > 0 || req.headers['transfer-encoding'] !== undefined)) {
      throw new Refusal('bad-request', 'Send the body as JSON, with the Content-Type application/json.');
    }
    const call = {
      params: endpoint.params?.parse(req.params),
      query: endpoint.query?.parse(req.query),
      body: endpoint.body?.parse(req.body ?? {}),
      actor, req, res,
    } as Call<Endpoint<P, Q, B, R>>;
    const answer = await handler(call);
    if (res.headersSent || !endpoint.response) return;
    if (!res.getHeader('Cache-Control')) res.setHeader('Cache-Control', actor.userId ? 'private, no-cache' : 'no-cache');
    res.json(answer);
  });
}
