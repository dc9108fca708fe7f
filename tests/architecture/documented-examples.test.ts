/** The examples in doc comments are run, so that they stay true: `@example expression // => expected`. */
import { describe, expect, test } from 'vitest';
import { pathToFileURL } from 'node:url';
import { join } from 'node:path';
import { readSource, ROOT, sourceFiles } from '#tests/support/source-files.ts';

interface Example {
  readonly path: string;
  readonly code: string;
  readonly expected: string;
}

const EXAMPLE = /@example\s+(.+?)\s*\/\/\s*=>\s*(.+?)\s*(?:\*\/|\n)/g;

const examples: Example[] = sourceFiles('shared').flatMap((path) =>
  [...readSource(path).matchAll(EXAMPLE)].map((match) => ({
    path,
    code: match[1] ?? '',
    expected: match[2] ?? '',
  })),
);

describe('documented examples', () => {
  test('there are some', () => {
    expect(examples.length).toBeGreaterThan(20);
  });

  test.each(examples)('$path: $code', async ({ path, code, expected }) => {
    const module = (await import(/* @vite-ignore */ pathToFileURL(join(ROOT, path)).href)) as Record<
      string,
      unknown
    >;
    const names = Object.keys(module);
    const run = (expression: string): unknown =>
      new Function(...names, `return (${expression});`)(...names.map((name) => module[name]));

    const actual = run(code);

    const wanted = run(expected);
    if (typeof wanted === 'number' && Number.isFinite(wanted)) {
      expect(actual).toBeCloseTo(wanted, 9 - Math.ceil(Math.log10(Math.max(1e-300, Math.abs(wanted)))));
    } else expect(actual).toEqual(wanted);
  });
});
