import { existsSync, readFileSync } from 'node:fs';
import path from 'node:path';
import express, { type RequestHandler, type Router } from 'express';

/** Serves the built client: hashed assets for ever, the page itself always fresh. */
export function staticFiles(clientDir: string): { assets: Router; page: RequestHandler } {
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
  return {
    assets,
    page: (req, res, next) => {
      if (req.method !== 'GET' && req.method !== 'HEAD') {
        next();
        return;
      }
      res.setHeader('Cache-Control', 'no-cache');
      if (html === null) res.status(503).type('text/plain').send('The client is not built. Run: npm run build');
      else res.type('html').send(html);
    },
  };
}
