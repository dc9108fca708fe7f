import type { Server } from 'node:http';
import path from 'node:path';
import express from 'express';
import type { RequestHandler } from 'express';

export interface ServedClient {
  readonly handler: RequestHandler;
  close(): Promise<void>;
}

const YEAR_SECONDS = 31_536_000;

/** The built client: files with a hash in their name are kept for ever, index.html is asked for every time. */
export function serveBuiltClient(folder: string): ServedClient {
  const router = express.Router();
  router.use(
    '/assets',
    express.static(path.join(folder, 'assets'), {
      immutable: true,
      maxAge: YEAR_SECONDS * 1000,
      index: false,
      fallthrough: false,
    }),
  );
  router.use(express.static(folder, { index: false, setHeaders: (response) => noCache(response) }));
  router.get('/{*any}', (_request, response) => {
    noCache(response);
    response.sendFile('index.html', { root: folder });
  });
  return { handler: router, close: () => Promise.resolve() };
}

/** While developing: Vite inside this process, its channel for hot reloading on the same port. */
export async function serveLiveClient(server: Server): Promise<ServedClient> {
  const { createServer } = await import('vite');
  const vite = await createServer({
    server: { middlewareMode: true, hmr: { server } },
    appType: 'spa',
    clearScreen: false,
  });
  return { handler: vite.middlewares, close: () => vite.close() };
}

function noCache(response: { setHeader(name: string, value: string): unknown }): void {
  response.setHeader('cache-control', 'no-cache');
}
