/**
 * Installs the packages when node_modules does not answer to package-lock.json. The database driver is the only
 * package compiled here (about a minute); its binary is kept in the user's cache, so that a second clone is quick.
 */
import { createHash } from 'node:crypto';
import { copyFileSync, existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { homedir } from 'node:os';
import { join } from 'node:path';
import { runWithProgress } from './report-progress.mjs';
import { ROOT } from './root.mjs';

const STAMP = join(ROOT, 'node_modules', '.holdwater-installed');
const LOCK = join(ROOT, '.cache', 'install.lock');
const BINARY = join(ROOT, 'node_modules', 'sqlite3', 'build', 'Release', 'node_sqlite3.node');

export async function ensureInstalled() {
  const wanted = fingerprint();
  if (isInstalled(wanted)) return;
  await withLock(async () => {
    if (isInstalled(wanted)) return;
    await runWithProgress(
      'Installing packages',
      npm(),
      ['ci', '--ignore-scripts', '--no-audit', '--no-fund'],
      {
        cwd: ROOT,
        quiet: true,
      },
    );
    await ensureDriver();
    writeFileSync(STAMP, wanted);
  });
}

function isInstalled(wanted) {
  return existsSync(STAMP) && readFileSync(STAMP, 'utf8') === wanted && existsSync(BINARY);
}

function fingerprint() {
  const hash = createHash('sha256');
  hash.update(readFileSync(join(ROOT, 'package-lock.json')));
  hash.update(`${process.version} ${process.platform} ${process.arch}`);
  return hash.digest('hex');
}

function npm() {
  return process.platform === 'win32' ? 'npm.cmd' : 'npm';
}

async function ensureDriver() {
  const { version } = JSON.parse(readFileSync(join(ROOT, 'node_modules', 'sqlite3', 'package.json'), 'utf8'));
  const name = `sqlite3-${version}-abi${process.versions.modules}-${process.platform}-${process.arch}.node`;
  const cache = join(process.env.XDG_CACHE_HOME ?? join(homedir(), '.cache'), 'holdwater');
  const kept = join(cache, name);
  if (existsSync(kept)) {
    mkdirSync(join(BINARY, '..'), { recursive: true });
    copyFileSync(kept, BINARY);
    if (await driverWorks()) return;
    rmSync(kept);
  }
  await runWithProgress(
    'Preparing the database driver, once, about a minute',
    npm(),
    ['rebuild', 'sqlite3'],
    {
      cwd: ROOT,
      quiet: true,
    },
  );
  try {
    mkdirSync(cache, { recursive: true });
    copyFileSync(BINARY, kept);
  } catch {
    // The cache only saves time: a home folder that cannot be written is no reason to stop.
  }
}

async function driverWorks() {
  try {
    await runWithProgress('Trying the kept database driver', process.execPath, ['-e', "require('sqlite3')"], {
      cwd: ROOT,
      quiet: true,
    });
    return true;
  } catch {
    return false;
  }
}

/** One install at a time: a second start waits for the first, and takes over when the first has died. */
async function withLock(work) {
  mkdirSync(join(ROOT, '.cache'), { recursive: true });
  for (;;) {
    try {
      writeFileSync(LOCK, String(process.pid), { flag: 'wx' });
      break;
    } catch {
      const holder = Number(readIfThere(LOCK));
      if (!holder || !isAlive(holder)) {
        rmSync(LOCK, { force: true });
        continue;
      }
      console.log(`Another start (process ${holder}) is installing; waiting for it.`);
      await new Promise((resolve) => setTimeout(resolve, 3000));
    }
  }
  try {
    await work();
  } finally {
    rmSync(LOCK, { force: true });
  }
}

function readIfThere(path) {
  return existsSync(path) ? readFileSync(path, 'utf8') : '';
}

function isAlive(pid) {
  try {
    process.kill(pid, 0);
    return true;
  } catch {
    return false;
  }
}
