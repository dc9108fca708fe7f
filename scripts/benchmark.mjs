/** `npm run benchmark [-- group]`: one line per figure; ends with code 1 when one is short. */
import { join } from 'node:path';
import { ensureBuilt } from './build.mjs';
import { ensureInstalled } from './install.mjs';
import { ROOT } from './root.mjs';
import { runChild } from './run-child.mjs';

await ensureInstalled();
await ensureBuilt();
runChild(['--import', 'tsx', join('tests', 'benchmarks', 'run.ts'), ...process.argv.slice(2)], { cwd: ROOT });
