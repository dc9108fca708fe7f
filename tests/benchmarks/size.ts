/** What a browser must load before it can work, in script, compressed as the server sends it. */
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { gzipSync } from 'node:zlib';
import type { Figure } from './run.ts';

interface Chunk {
  readonly file: string;
  readonly isEntry?: boolean;
  readonly src?: string;
  readonly imports?: readonly string[];
}

const CLIENT = join(import.meta.dirname, '../../dist/client');

/** The entry and the screen with everything they import statically; what a screen loads later counts for itself. */
export async function benchmarks(): Promise<Figure[]> {
  const manifest = JSON.parse(readFileSync(join(CLIENT, '.vite/manifest.json'), 'utf8')) as Record<
    string,
    Chunk
  >;
  const entry = Object.keys(manifest).filter((name) => manifest[name]?.isEntry);
  const screen = (part: string) =>
    Object.keys(manifest).filter((name) => manifest[name]?.src?.includes(part));
  const signIn = kilobytes(manifest, [...entry, ...screen('session/routes/')]);
  const report = kilobytes(manifest, [
    ...entry,
    ...screen('app/report-screen'),
    ...screen('features/report/routes/'),
  ]);
  return [
    { name: 'script of sign in', value: signIn, reach: 150, unit: 'kB', ok: signIn <= 150 },
    { name: 'script of the report, in all', value: report, reach: 450, unit: 'kB', ok: report <= 450 },
  ];
}

function kilobytes(manifest: Record<string, Chunk>, roots: readonly string[]): number {
  const files = new Set<string>();
  const visit = (name: string) => {
    const chunk = manifest[name];
    if (!chunk || files.has(chunk.file)) return;
    files.add(chunk.file);
    chunk.imports?.forEach(visit);
  };
  roots.forEach(visit);
  const bytes = [...files]
    .filter((file) => file.endsWith('.js'))
    .reduce((sum, file) => sum + gzipSync(readFileSync(join(CLIENT, file))).length, 0);
  return bytes / 1000;
}
