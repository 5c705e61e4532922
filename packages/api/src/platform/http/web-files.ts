import { existsSync } from 'node:fs';
import { join } from 'node:path';
import express, { type Express } from 'express';

const YEAR = 'public, max-age=31536000, immutable';
const HASHED = /-[A-Z0-9]{8}\.\w+(?:\.br)?$/;

/**
 * Serves the built browser application: brotli files made at build time where the browser takes them, the start page for
 * addresses of screens, 404 for missing files.
 */
export function mountWebFiles(app: Express, root: string): void {
  if (root === '') return;
  app.get('/*path', (request, response, next) => {
    const path = request.path;
    if (!/^\/[\w./-]+\.\w+$/.test(path) || path.includes('..')) {
      next();
      return;
    }
    const takesBrotli = /\bbr\b/.test(request.get('accept-encoding') ?? '');
    if (!takesBrotli || !existsSync(join(root, `${path}.br`))) {
      next();
      return;
    }
    response.set({
      'Content-Encoding': 'br',
      Vary: 'Accept-Encoding',
      'Cache-Control': HASHED.test(path) ? YEAR : 'no-cache',
    });
    response.type(path.slice(path.lastIndexOf('.')));
    response.sendFile(`${path}.br`, { root, cacheControl: false, headers: {} });
  });
  app.use(
    express.static(root, {
      index: false,
      redirect: false,
      setHeaders: (response, path) => {
        response.setHeader('Cache-Control', HASHED.test(path) ? YEAR : 'no-cache');
      },
    }),
  );
  app.get('/*path', (request, response, next) => sendStartPage(root, request.path, response, next));
  app.get('/', (request, response, next) => sendStartPage(root, request.path, response, next));
}

function sendStartPage(
  root: string,
  path: string,
  response: express.Response,
  next: express.NextFunction,
): void {
  if (path.startsWith('/api/') || /\.\w+$/.test(path)) {
    next();
    return;
  }
  response.set('Cache-Control', 'no-store');
  response.sendFile('index.html', { root, cacheControl: false });
}
