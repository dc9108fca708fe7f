import { describe, expect, test } from 'vitest';
import { runsTest } from '#shared/statistics/runs-test.ts';

/** One residual for each sign written. */
const signs = (text: string): number[] => [...text].map((sign) => (sign === '+' ? 1 : sign === '-' ? -1 : 0));

describe('runs test', () => {
  test('of signs in two blocks: has 2 runs and a small exact p-value', () => {
    // Of the 252 orders of five and five signs, two have 2 runs: p = 2 · 2/252.
    const found = runsTest(signs('+++++-----'));

    expect(found?.runs).toBe(2);
    expect(found?.pValue).toAgreeTo(4 / 252, { digits: 13 });
    expect(found?.z).toBeLessThan(-2);
  });

  test('of signs in turn: has as many runs as signs', () => {
    const found = runsTest(signs('+-+-+-+-+-'));

    expect(found?.runs).toBe(10);
    expect(found?.z).toBeGreaterThan(2);
  });

  // Mean 2·11·15/26 + 1 and variance from the formula of Wald and Wolfowitz, worked out by hand.
  test('of 11 and 15 signs: mean and z follow the formula', () => {
    const found = runsTest(signs('++--+++-+--+-----+--++--+--+').slice(0, 26));

    expect(found).toMatchObject({ above: 11, below: 15, runs: 14 });
    expect(found?.expected).toAgreeTo(330 / 26 + 1, { digits: 14 });
    expect(found?.z).toAgreeTo((14 - (330 / 26 + 1)) / Math.sqrt((330 * 304) / (26 * 26 * 25)), {
      digits: 13,
    });
  });

  test('zeros: are left out', () => {
    expect(runsTest(signs('++00--0+-'))).toMatchObject({ above: 3, below: 3, runs: 4 });
  });

  test('of one residual below: cannot be made', () => {
    expect(runsTest(signs('++++-'))).toBeNull();
  });

  test('of 300 signs in turn: takes the normal limit', () => {
    const found = runsTest(signs('+-'.repeat(150)));

    expect(found?.runs).toBe(300);
    expect(found?.pValue).toBeLessThan(1e-60);
  });
});
