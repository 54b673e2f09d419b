import connectPgSimple from 'connect-pg-simple';
import type { NextFunction, Request, RequestHandler, Response } from 'express';
import session from 'express-session';
import type pg from 'pg';
import { visitor, type Actor } from '#server/actor.ts';

declare module 'express-session' {
  interface SessionData {
    userId?: string;
    /** Set when a form token was asked for, so that the session is kept and the token stays bound to it. */
    hasToken?: boolean;
  }
}

export const sessionCookie = 'sillstone.session';
const twoWeeksMs = 14 * 24 * 3600 * 1000;

/** Sessions in PostgreSQL, so that any process can answer any request. */
export function sessionMiddleware(pool: pg.Pool, secret: string, secure: boolean): RequestHandler {
  const Store = connectPgSimple(session);
  return session({
    store: new Store({ pool, tableName: 'sessions', createTableIfMissing: false, pruneSessionInterval: 3600 }),
    name: sessionCookie,
    secret,
    resave: false,
    saveUninitialized: false,
    rolling: false,
    cookie: { httpOnly: true, sameSite: 'lax', secure, maxAge: twoWeeksMs, path: '/' },
  });
}

/** Finds out who asks. A session whose person is gone or disabled counts as a visitor's. */
export function actorMiddleware(find: (userId: string) => Promise<Actor | null>): RequestHandler {
  return async (req: Request, res: Response, next: NextFunction) => {
    const userId = req.session?.userId;
    res.locals.actor = (userId ? await find(userId) : null) ?? visitor;
    next();
  };
}

/** Gives the visitor a new session for the person who has just proved who they are, and waits until it is stored. */
export async function startSession(req: Request, userId: string): Promise<void> {
  await new Promise<void>((resolve, reject) => req.session.regenerate((error) => (error ? reject(error as Error) : resolve())));
  req.session.userId = userId;
  req.session.hasToken = true;
  await new Promise<void>((resolve, reject) => req.session.save((error) => (error ? reject(error as Error) : resolve())));
}

export async function endSession(req: Request, res: Response): Promise<void> {
  await new Promise<void>((resolve, reject) => req.session.destroy((error) => (error ? reject(error as Error) : resolve())));
  res.clearCookie(sessionCookie, { path: '/' });
}
