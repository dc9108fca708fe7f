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
  (message) => {
    if (typeof message?.ready === 'string') void announce(message.ready);
  },
);
