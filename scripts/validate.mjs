/** All checks, one after the other: lint, types, layers and units, API, browser. Stops at the first that fails. */
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { ensureBuilt } from './build.mjs';
import { ensureChromium } from './chromium.mjs';
import { runWithProgress } from './report-progress.mjs';
import { ROOT } from './root.mjs';

const bin = (name, file) => join(ROOT, 'node_modules', name, file);

export async function validate() {
  const chromium = await ensureChromium();
  const node = (sentence, args) =>
    runWithProgress(sentence, process.execPath, args, {
      cwd: ROOT,
      env: { ...process.env, CHROMIUM_PATH: chromium },
    });

  await node('Linting', [bin('eslint', 'bin/eslint.js'), '.', '--max-warnings', '0']);
  await node('Checking the format', [
    bin('prettier', 'bin/prettier.cjs'),
    '--check',
    '--log-level',
    'warn',
    '.',
  ]);
  await node('Checking types', [bin('typescript', 'bin/tsc'), '-p', '.']);
  await node('Checking that shared code knows neither browser nor server', [
    bin('typescript', 'bin/tsc'),
    '-p',
    'shared',
  ]);
  await node('Layers, units, API and screens', [
    bin('vitest', 'vitest.mjs'),
    'run',
    '--project',
    'node',
    '--project',
    'client',
  ]);
  await ensureBuilt();
  await node('In a real browser', [bin('vitest', 'vitest.mjs'), 'run', '--project', 'e2e']);
}

if (import.meta.url === pathToFileURL(process.argv[1] ?? '').href) await validate();
