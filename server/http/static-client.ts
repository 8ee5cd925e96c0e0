import { existsSync } from 'node:fs';
import path from 'node:path';
import express, { Router } from 'express';

const ONE_YEAR_MS = 365 * 24 * 60 * 60 * 1000;

/**
 * The built client. Files below assets/ have their content's hash in their name and may be kept for ever; index.html
 * names them and is asked for each time. Any address without a file extension belongs to the client's own router.
 */
export function staticClient(appRoot: string): Router {
  const folder = path.join(appRoot, 'dist', 'client');
  const router = Router();
  router.use(
    '/assets',
    express.static(path.join(folder, 'assets'), { immutable: true, maxAge: ONE_YEAR_MS }),
  );
  router.use(express.static(folder, { index: false, maxAge: 0 }));
  router.get('/{*path}', (req, res, next) => {
    const isPage = path.extname(req.path) === '' && !req.path.startsWith('/assets/');
    if (!isPage || !existsSync(path.join(folder, 'index.html'))) {
      next();
      return;
    }
    res.set('cache-control', 'no-cache');
    res.sendFile('index.html', { root: folder, cacheControl: false });
  });
  return router;
}
