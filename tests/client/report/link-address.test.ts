import { describe, expect, test } from 'vitest';
import { linkAddress } from '#src/features/report/editor/link-address.ts';

const ORIGIN = 'https://holdwater.example';
const hrefOf = (typed: string) => {
  const address = linkAddress(typed, ORIGIN);
  return address.ok ? address.href : null;
};

describe('where a link leads', () => {
  test.each([
    ['https://skerry.example/jets?n=2', 'https://skerry.example/jets?n=2'],
    ['  http://skerry.example  ', 'http://skerry.example'],
    ['skerry.example/jets', 'https://skerry.example/jets'],
    ['odile.marsk@skerry.example', 'mailto:odile.marsk@skerry.example'],
    ['mailto:odile.marsk@skerry.example', 'mailto:odile.marsk@skerry.example'],
    ['/team/tern-rock/problem/1/trials/B#B12', `${ORIGIN}/team/tern-rock/problem/1/trials/B#B12`],
    ['#4', '#4'],
  ])('%s: leads to %s', (typed, href) => {
    expect(hrefOf(typed)).toBe(href);
  });

  test.each([
    '',
    'javascript:alert(1)',
    ' JavaScript:alert(1)',
    'data:text/html,x',
    '//elsewhere.example',
    'two words',
    'ftp://a.example',
  ])('%j: is refused, and the sentence says what may be written', (typed) => {
    const address = linkAddress(typed, ORIGIN);

    expect(address.ok ? address.href : address.sentence).toContain('Write one of these.');
  });
});
