import type { Server } from 'node:http';
import { readFile } from 'node:fs/promises';
import path from 'node:path';
import express from 'express';
import type { RequestHandler } from 'express';
import { styleNonce } from './middleware/security-headers.ts';

export interface ServedClient {
  readonly handler: RequestHandler;
  close(): Promise<void>;
}

const YEAR_SECONDS = 31_536_000;

/** Stands in index.html where the nonce of each answer goes. */
const NONCE_PLACE = '{style-nonce}';

/**
 * The built client: files with a hash in their name are kept for ever; index.html is never kept, for it carries the
 * nonce of its own answer.
 */
export async function serveBuiltClient(folder: string): Promise<ServedClient> {
  const page = await readFile(path.join(folder, 'index.html'), 'utf8');
  const sendPage: RequestHandler = (_request, response) => {
    response.setHeader('cache-control', 'no-store');
    response.type('html').send(page.replace(NONCE_PLACE, styleNonce(response)));
  };
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
  router.get('/index.html', sendPage);
  router.use(express.static(folder, { index: false, setHeaders: noCache }));
  router.get('/{*any}', sendPage);
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
