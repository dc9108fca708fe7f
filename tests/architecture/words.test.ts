/** What must never stand in the project: machine paths, registries' hosts, unfinished work. */
import { execFileSync } from 'node:child_process';
import { describe, expect, test } from 'vitest';
import { readSource, ROOT } from '#tests/support/source-files.ts';

const tracked = execFileSync('git', ['ls-files', '-co', '--exclude-standard'], {
  cwd: ROOT,
  encoding: 'utf8',
})
  .split('\n')
  .filter((path) => /\.(ts|tsx|mjs|js|json|md|css|html)$/.test(path) && !path.startsWith('fonts/'));

describe('words', () => {
  test('no lock file records where a package was downloaded', () => {
    expect(readSource('package-lock.json')).not.toContain('"resolved"');
  });

  test('nothing is left to be done later without being said', () => {
    const unfinished = new RegExp(['TO' + 'DO', 'FIX' + 'ME', 'coming ' + 'soon'].join('|'));
    const found = tracked.filter((path) => path !== 'package-lock.json' && unfinished.test(readSource(path)));
    expect(found).toEqual([]);
  });

  test('no file names a folder of the machine it was written on', () => {
    const folders = new RegExp(['/' + 'work/', '/' + 'root/'].join('|'));
    const found = tracked.filter((path) => path !== 'package-lock.json' && folders.test(readSource(path)));
    expect(found).toEqual([]);
  });
});
