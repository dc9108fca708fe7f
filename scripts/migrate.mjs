/** `npm run migrate`: brings the database to the newest form and stops. The server does the same when it starts. */
import { join } from 'node:path';
import { ensureInstalled } from './install.mjs';
import { ROOT } from './root.mjs';
import { runChild } from './run-child.mjs';

await ensureInstalled();
runChild(['--import', 'tsx', join('server', 'database', 'migrate.ts')], { cwd: ROOT });
