import { existsSync } from 'node:fs';
import path from 'node:path';
import express, { type NextFunction, type Request, type Response, type Router } from 'express';

/**
 * The built web pages. Assets have hashed names and are kept for ever; pages are asked for anew
 * each time, so that an old tab finds the new assets. A missing asset is a 404, never a page.
 */
export function servePages(webDir: string): Router {
  const router = express.Router();
  router.use(
    '/assets',
    express.static(path.join(webDir, 'assets'), { immutable: true, maxAge: '1y', index: false }),
    (_request: Request, response: Response) => {
      response.status(404).type('text/plain').send('This file does not exist (any more).');
    },
  );
  router.use(express.static(webDir, { index: false, maxAge: '1h' }));
  router.use((request: Request, response: Response, next: NextFunction) => {
    if (request.method !== 'GET' && request.method !== 'HEAD') return next();
    const file = path.join(webDir, 'index.html');
    if (!existsSync(file)) return next();
    response.setHeader('Cache-Control', 'no-cache');
    response.sendFile(file, { cacheControl: false });
  });
  return router;
}
