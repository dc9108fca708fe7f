/** `npm start`: installs, builds and serves; the server migrates and, on its first run, loads the demonstration. */
import { join } from 'node:path';
import { announce } from './announce.mjs';
import { ensureBuilt } from './build.mjs';
import { ensureInstalled } from './install.mjs';
import { ROOT } from './root.mjs';
import { runChild } from './run-child.mjs';

await ensureInstalled();
await ensureBuilt();
console.log('Starting the server …');
runChild(
  ['--enable-source-maps', join(ROOT, 'dist', 'server', 'index.js')],
  { cwd: ROOT, env: { NODE_ENV: 'production', ...process.env } },
  (message) => {
    if (typeof message?.ready === 'string') void announce(message.ready);
  },
);
