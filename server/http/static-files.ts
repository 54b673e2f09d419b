import { existsSync, readFileSync } from 'node:fs';
import path from 'node:path';
import express, { type RequestHandler, type Router } from 'express';
import { withHead, withoutIndex, type PageHead } from './page-head.ts';

export interface PageSettings {
  /** What the page at a path says of itself; null where it has nothing of its own to say. */
  describe?: (pathname: string) => Promise<PageHead | null>;
  /** Demonstration data: no page is listed by search services. */
  demonstration?: boolean;
}

/** Serves the built client: hashed assets for ever, the page itself always fresh and with the head of what it shows. */
export function staticFiles(clientDir: string, { describe, demonstration = false }: PageSettings = {}): { assets: Router; page: RequestHandler } {
  const root = path.resolve(clientDir);
  const assets = express.Router();
  assets.use('/assets', express.static(path.join(root, 'assets'), { immutable: true, maxAge: '1y', index: false, fallthrough: true }));
  assets.use('/assets', (_req, res) => {
    res.status(404).type('text/plain').send('No such file.');
  });
  assets.use(express.static(root, { index: false, maxAge: '1h' }));
  const file = path.join(root, 'index.html');
  // Read once at the start: the server may have given up the right to read the folder by the time it is asked for.
  const html = existsSync(file) ? readFileSync(file, 'utf8') : null;

  /** A page whose head cannot be had is served all the same, and kept out of search services. */
  async function headOf(pathname: string): Promise<PageHead | 'unknown' | null> {
    try {
      return await describe?.(pathname) ?? null;
    } catch {
      return 'unknown';
    }
  }

  return {
    assets,
    page: async (req, res, next) => {
      if (req.method !== 'GET' && req.method !== 'HEAD') {
        next();
        return;
      }
      res.setHeader('Cache-Control', 'no-cache');
      if (html === null) {
        res.status(503).type('text/plain').send('The client is not built. Run: npm run build');
        return;
      }
      const head = await headOf(req.originalUrl.split('?', 1)[0] ?? '/');
      const indexed = !demonstration && head !== 'unknown' && (head === null || head.indexed);
      if (!indexed) res.setHeader('X-Robots-Tag', 'noindex');
      const own = head === null || head === 'unknown' ? (indexed ? html : withoutIndex(html)) : withHead(html, { ...head, indexed });
      res.type('html').send(own);
    },
  };
}
