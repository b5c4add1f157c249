import { existsSync } from 'node:fs';
import { fileURLToPath } from 'node:url';

import express, { Router, type RequestHandler } from 'express';

const DIST = fileURLToPath(new URL('../../dist', import.meta.url));

/** The built client. Files under /assets have their contents in their names and never change. */
export function serveBuiltClient(): Router {
  const router = Router();
  router.use(
    '/assets',
    express.static(`${DIST}/assets`, { immutable: true, maxAge: '1y', index: false, fallthrough: false }),
  );
  router.use(express.static(DIST, { maxAge: 0, index: false }));
  router.get('/{*any}', (_request, response, next) => {
    if (!existsSync(`${DIST}/index.html`)) {
      next();
      return;
    }
    response.set('Cache-Control', 'no-cache').sendFile('index.html', { root: DIST });
  });
  return router;
}

/** The client from its sources, with hot reload. Vite is loaded only here: a server in production never needs it. */
export async function serveClientSources(): Promise<{ middleware: RequestHandler; close(): Promise<void> }> {
  const { createServer } = await import('vite');
  const vite = await createServer({ server: { middlewareMode: true }, appType: 'spa' });
  return { middleware: vite.middlewares, close: () => vite.close() };
}
