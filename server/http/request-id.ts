import { randomUUID } from 'node:crypto';
import type { NextFunction, Request, Response } from 'express';

/** Gives every request an id that its answer, its log line and a reader's complaint share. */
export function requestId(req: Request, res: Response, next: NextFunction): void {
  res.locals.requestId = randomUUID();
  res.setHeader('X-Request-Id', res.locals.requestId as string);
  next();
}
