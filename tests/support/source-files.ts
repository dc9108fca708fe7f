import { readFileSync, readdirSync } from 'node:fs';
import { join, relative, resolve, dirname } from 'node:path';
import ts from 'typescript';

export const ROOT = resolve(import.meta.dirname, '../..');

/** Every .ts and .tsx file below the folders, as paths from the project's top, sorted. */
export function sourceFiles(...folders: readonly string[]): string[] {
  return folders
    .flatMap((folder) =>
      readdirSync(join(ROOT, folder), { recursive: true, withFileTypes: true })
        .filter((entry) => entry.isFile() && /\.tsx?$/.test(entry.name))
        .map((entry) => relative(ROOT, join(entry.parentPath, entry.name))),
    )
    .sort();
}

export function readSource(path: string): string {
  return readFileSync(join(ROOT, path), 'utf8');
}

/** What a file imports: own files as paths from the project's top, packages by name, `node:` modules as written. */
export function importsOf(path: string): string[] {
  const { importedFiles } = ts.preProcessFile(readSource(path), true, true);
  return importedFiles.map(({ fileName }) => {
    if (fileName.startsWith('#')) return fileName.slice(1);
    if (fileName.startsWith('.')) return relative(ROOT, resolve(ROOT, dirname(path), fileName));
    return fileName;
  });
}
