/** `npm run dev`: the server restarts when its code changes; the client is hot-reloaded by Vite inside it. */
import { join } from 'node:path';
import { announce } from './announce.mjs';
import { ensureInstalled } from './install.mjs';
import { ROOT } from './root.mjs';
import { runChild } from './run-child.mjs';

await ensureInstalled();
runChild(
  [
    join(ROOT, 'node_modules', 'tsx', 'dist', 'cli.mjs'),
    'watch',
    '--exclude',
    './dist/**',
    '--exclude',
    './data/**',
    join('server', 'index.ts'),
  ],
  { cwd: ROOT, env: { NODE_ENV: 'development', ...process.env } },
);

// The watcher stands between us and the server, so its word that it is ready does not reach us: ask.
const url = `http://${process.env.HOST ?? '127.0.0.1'}:${process.env.PORT ?? '4600'}`;
for (;;) {
  await new Promise((resolve) => setTimeout(resolve, 500));
  const isThere = await fetch(`${url}/api/health`).then(
    ({ ok }) => ok,
    () => false,
  );
  if (isThere) break;
}
await announce(url);
