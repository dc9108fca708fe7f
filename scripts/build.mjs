/** Builds the client with Vite and bundles the server with esbuild, unless what is in dist/ is up to date. */
import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { runWithProgress } from './report-progress.mjs';
import { ROOT } from './root.mjs';

const STAMP = join(ROOT, 'dist', '.built');
const SOURCES = [
  'src',
  'server',
  'shared',
  'templates',
  'index.html',
  'vite.config.ts',
  'tailwind.config.ts',
  'package-lock.json',
];

/** Every file that runs in a thread or a process of its own. */
export const SERVER_ENTRIES = [
  'server/index.ts',
  'server/evaluation/evaluation-worker.ts',
  'server/rendering/report-worker.ts',
];

export async function ensureBuilt() {
  const wanted = fingerprint();
  if (existsSync(STAMP) && readFileSync(STAMP, 'utf8') === wanted) return;
  rmSync(STAMP, { force: true });
  await runWithProgress(
    'Building the screens',
    process.execPath,
    [join(ROOT, 'node_modules', 'vite', 'bin', 'vite.js'), 'build', '--logLevel', 'warn'],
    { cwd: ROOT },
  );
  await buildServer();
  writeFileSync(STAMP, wanted);
}

export async function buildServer() {
  const { build } = await import('esbuild');
  mkdirSync(join(ROOT, 'dist', 'server'), { recursive: true });
  await build({
    entryPoints: SERVER_ENTRIES.map((entry) => join(ROOT, entry)),
    outdir: join(ROOT, 'dist', 'server'),
    outbase: join(ROOT, 'server'),
    bundle: true,
    packages: 'external',
    // Names like #shared/… are ours and are bundled; everything else stays a package.
    plugins: [
      {
        name: 'own-imports',
        setup: (step) =>
          step.onResolve({ filter: /^#/ }, ({ path }) => ({ path: join(ROOT, path.slice(1)) })),
      },
    ],
    platform: 'node',
    format: 'esm',
    target: 'node20',
    sourcemap: true,
    logLevel: 'warning',
    define: { 'process.env.NODE_ENV': '"production"' },
  });
}

function fingerprint() {
  const hash = createHash('sha256');
  for (const source of SOURCES) addTo(hash, source);
  return hash.digest('hex');
}

function addTo(hash, path) {
  const full = join(ROOT, path);
  if (!existsSync(full)) return;
  const entries = isFolder(full);
  if (!entries) {
    hash.update(path).update(readFileSync(full));
    return;
  }
  for (const entry of entries.sort()) addTo(hash, join(path, entry));
}

function isFolder(full) {
  try {
    return readdirSync(full);
  } catch {
    return null;
  }
}

if (import.meta.url === pathToFileURL(process.argv[1] ?? '').href) {
  const { ensureInstalled } = await import('./install.mjs');
  await ensureInstalled();
  rmSync(STAMP, { force: true });
  await ensureBuilt();
}
