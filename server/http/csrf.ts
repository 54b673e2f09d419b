import { doubleCsrf } from 'csrf-csrf';
import type { NextFunction, Request, Response } from 'express';
import { Refusal } from '#server/refusal.ts';

/** Form tokens: bound to the session, sent back in the header X-CSRF-Token by whatever changes something. */
export function csrfProtection(secret: string, secure: boolean) {
  const { generateCsrfToken, validateRequest } = doubleCsrf({
    getSecret: () => secret,
    getSessionIdentifier: (req) => req.session.id,
    cookieName: 'sillstone.csrf',
    cookieOptions: { httpOnly: true, sameSite: 'lax', secure, path: '/' },
    getCsrfTokenFromRequest: (req) => req.headers['x-csrf-token'],
  });
  return {
    issue(req: Request, res: Response): string {
      req.session.hasToken = true;
      return generateCsrfToken(req, res, { overwrite: true, validateOnReuse: false });
    },
    guard(exempt: (path: string) => boolean) {
      return (req: Request, res: Response, next: NextFunction): void => {
        if (req.method === 'GET' || req.method === 'HEAD' || req.method === 'OPTIONS' || exempt(req.path) || validateRequest(req)) next();
        else next(new Refusal('csrf-invalid', 'The form token is missing or has expired. Reload the token and send the request again; nothing was changed.'));
      };
    },
  };
}
export type CsrfProtection = ReturnType<typeof csrfProtection>;
