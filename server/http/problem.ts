import type { NextFunction, Request, Response } from 'express';
import type { Logger } from 'pino';
import * as z from 'zod';
import { refusalFromDatabase } from '#server/db/pg-errors.ts';
import { Refusal, refusalFromZod } from '#server/refusal.ts';
import { errorTitle } from '#shared/domain/error-codes.ts';
import type { Problem } from '#shared/contracts/problem.ts';

function toRefusal(error: unknown): Refusal | null {
  if (error instanceof Refusal) return error;
  if (error instanceof z.ZodError) return refusalFromZod(error);
  if (typeof error === 'object' && error !== null && 'type' in error && typeof error.type === 'string') {
    if (error.type === 'entity.parse.failed') return new Refusal('malformed-json', 'The request body is not valid JSON.');
    if (error.type === 'entity.too.large') return new Refusal('payload-too-large', 'The request body is larger than 1 MB.');
    if (error.type === 'encoding.unsupported' || error.type === 'charset.unsupported') return new Refusal('bad-request', 'The encoding of the request body is not supported.');
  }
  if (error instanceof URIError) return new Refusal('bad-request', 'The address has a broken percent escape.');
  return refusalFromDatabase(error);
}

/** Writes a refusal as a problem document (RFC 9457). */
export function sendProblem(res: Response, refusal: Refusal): void {
  const body: Problem = {
    type: `about:blank#${refusal.code}`,
    title: errorTitle[refusal.code],
    status: refusal.status,
    detail: refusal.message,
    code: refusal.code,
    requestId: String(res.locals.requestId ?? ''),
    ...(refusal.details.errors ? { errors: refusal.details.errors } : {}),
    ...(refusal.details.context ? { context: refusal.details.context } : {}),
  };
  if (refusal.details.retryAfterS) res.setHeader('Retry-After', String(refusal.details.retryAfterS));
  res.setHeader('Cache-Control', 'no-store');
  res.status(refusal.status).type('application/problem+json').send(JSON.stringify(body));
}

/** The last handler: everything thrown becomes a problem document; what we did not foresee is logged and leaks nothing. */
export function problemHandler(log: Logger) {
  return (error: unknown, req: Request, res: Response, next: NextFunction): void => {
    const refusal = toRefusal(error);
    if (!refusal) log.error({ err: error, requestId: res.locals.requestId, method: req.method, path: req.path }, 'unforeseen error');
    if (res.headersSent) {
      next(error);
      return;
    }
    sendProblem(res, refusal ?? new Refusal('internal', 'Something went wrong on our side. Nothing was saved. Try again, and tell the curator the request number if it stays.'));
  };
}
