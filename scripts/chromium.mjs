/** Finds a Chromium for the browser tests, and installs Debian's when it is missing and this process may. */
import { accessSync, constants } from 'node:fs';
import { delimiter, join } from 'node:path';
import { runWithProgress } from './report-progress.mjs';

const NAMES = ['chromium', 'chromium-browser', 'google-chrome'];
const COMMAND = 'sudo apt-get update && sudo apt-get install -y chromium';

export function findChromium() {
  const named = process.env.CHROMIUM_PATH;
  if (named) return named;
  for (const folder of (process.env.PATH ?? '').split(delimiter)) {
    for (const name of NAMES) {
      const path = join(folder, name);
      if (isExecutable(path)) return path;
    }
  }
  return null;
}

export async function ensureChromium() {
  const found = findChromium();
  if (found) return found;
  const mayInstall =
    process.platform === 'linux' && process.getuid?.() === 0 && isExecutable('/usr/bin/apt-get');
  if (mayInstall) {
    await runWithProgress('Asking Debian for its list of packages', 'apt-get', ['update'], { quiet: true });
    await runWithProgress(
      'Installing Chromium for the browser tests',
      'apt-get',
      ['install', '-y', 'chromium'],
      {
        quiet: true,
        env: { ...process.env, DEBIAN_FRONTEND: 'noninteractive' },
      },
    );
    const installed = findChromium();
    if (installed) return installed;
  }
  throw new Error(
    `The browser tests need Chromium, and none is on the PATH.\nInstall it with:  ${COMMAND}\n` +
      'or name one you have with CHROMIUM_PATH=/path/to/chromium.',
  );
}

function isExecutable(path) {
  try {
    accessSync(path, constants.X_OK);
    return true;
  } catch {
    return false;
  }
}
