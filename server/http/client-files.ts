import { existsSync } from 'node:fs';
import type { Server } from 'node:http';
import { fileURLToPath } from 'node:url';

import express, { Router, type RequestHandler } from 'express';
import type { ViteDevServer } from 'vite';

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

export interface ClientSources {
  readonly middleware: RequestHandler;
  open(server: Server): Promise<void>;
  close(): Promise<void>;
}

/**
 * The client from its sources, with hot reload over the server's own port, so that two at once never meet.
 * Vite is loaded only here: a server in production never needs it.
 */
export function serveClientSources(): ClientSources {
  let vite: ViteDevServer | undefined;
  return {
    middleware(request, response, next) {
      if (vite === undefined) next();
      else vite.middlewares(request, response, next);
    },
    async open(server) {
      const { createServer } = await import('vite');
      vite = await createServer({ server: { middlewareMode: true, hmr: { server } }, appType: 'spa' });
    },
    async close() {
      await vite?.close();
    },
  };
}
