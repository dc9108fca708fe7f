import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { compareDecimals, decimalToText } from '#shared/numeric/decimal.ts';
import { roundDifference } from '#shared/formatting/difference.ts';
import { roundOutward, roundWithUncertainty, type RoundingRule } from '#shared/formatting/rounded.ts';

const shown = (value: number, u: number | null, rule: RoundingRule): string => {
  const rounded = roundWithUncertainty(value, u, rule);
  return `${decimalToText(rounded.value)} ± ${rounded.u === null ? 'none' : decimalToText(rounded.u)}`;
};

describe('round with uncertainty', () => {
  // 10.057 62 with u 0.027 is the example of JCGM 100:2008, 7.2.6 (from memory).
  test.each([
    [10.05762, 0.027, '10.058 ± 0.027'],
    [100.02147, 0.00035, '100.02147 ± 0.00035'],
    [46.37, 0.39, '46.37 ± 0.39'],
    [46.375, 0.5, '46.38 ± 0.50'],
    [46.365, 0.5, '46.36 ± 0.50'],
    [0.5, 0.0996, '0.50 ± 0.10'],
    [12345, 850, '12340 ± 850'],
    [0, 0.4, '0.00 ± 0.40'],
    [-0.001, 0.4, '0.00 ± 0.40'],
    [1.2345e-7, 4.2e-9, '0.0000001234 ± 0.0000000042'],
  ])('%d with u %d, two digits: is %s', (value, u, expected) => {
    expect(shown(value, u, 'two digits')).toBe(expected);
  });

  test.each([
    [46.37, 0.39, '46.4 ± 0.4'],
    [46.37, 0.14, '46.37 ± 0.14'],
    [46.37, 0.96, '46.4 ± 1.0'],
    [0.967, 0.0063, '0.967 ± 0.006'],
    [480.2, 31, '480 ± 30'],
    [29.849999999999998, 0.4, '29.8 ± 0.4'],
    [29.95, 0.4, '30.0 ± 0.4'],
  ])('%d with u %d, one or two digits: is %s', (value, u, expected) => {
    expect(shown(value, u, 'one or two digits')).toBe(expected);
  });

  test.each([
    [9.817, null, '9.817 ± none'],
    [1 / 3, null, '0.333333 ± none'],
    [5, 0, '5 ± none'],
    [123456, null, '123456 ± none'],
  ])('%d without uncertainty: has at most six figures', (value, u, expected) => {
    expect(shown(value, u, 'two digits')).toBe(expected);
  });

  test.each([
    [NaN, 1],
    [1, NaN],
    [1, -1],
    [Infinity, 1],
  ])('%d with u %d: throws', (value, u) => {
    expect(() => roundWithUncertainty(value, u, 'two digits')).toThrow(RangeError);
  });

  test('a tie that lost its last bit: is still a tie', () => {
    expect(shown(46.45 * 0.01 * 100, 0.4, 'one or two digits')).toBe(shown(46.45, 0.4, 'one or two digits'));
  });

  test('law: with one u, a larger value is never shown smaller', () => {
    const values = fc.double({ min: -1e4, max: 1e4, noNaN: true });
    const us = fc.double({ min: 1e-3, max: 1e3, noNaN: true });
    const rules = fc.constantFrom<RoundingRule>('two digits', 'one or two digits');

    fc.assert(
      fc.property(values, values, us, rules, (a, b, u, rule) => {
        const [low, high] = [Math.min(a, b), Math.max(a, b)];
        const [shownLow, shownHigh] = [
          roundWithUncertainty(low, u, rule),
          roundWithUncertainty(high, u, rule),
        ];

        expect(compareDecimals(shownLow.value, shownHigh.value)).toBeLessThanOrEqual(0);
      }),
    );
  });

  test('law: two digits are two digits, and within half a unit of them', () => {
    fc.assert(
      fc.property(fc.double({ min: 1e-6, max: 1e6, noNaN: true }), (u) => {
        const rounded = roundWithUncertainty(1, u, 'two digits');
        const figures = Number(rounded.u?.digits ?? 0n);

        expect(figures).toBeGreaterThanOrEqual(10);
        expect(figures).toBeLessThanOrEqual(99);
        expect(Math.abs(figures * 10 ** -rounded.places - u)).toBeLessThanOrEqual(
          0.5000001 * 10 ** -rounded.places,
        );
      }),
    );
  });

  test('roundOutward: never loses what the limits held', () => {
    const { low, high } = roundOutward(3.9985, 4.3325, 2);

    expect(decimalToText(low)).toBe('3.99');
    expect(decimalToText(high)).toBe('4.34');
  });
});

describe('round a difference', () => {
  const rule: RoundingRule = 'one or two digits';

  test('figures that would not subtract: get one more decimal in all three', () => {
    // 46.4 − 47.9 is −1.5 in shown figures, while the difference rounds to −1.6.
    const result = roundDifference(
      { value: 46.37, u: 0.4 },
      { value: 47.94, u: 0.5 },
      { value: -1.57, u: 0.7 },
      rule,
    );

    expect(result.morePlaces).toBe(1);
    expect([result.a, result.b, result.difference].map(({ value }) => decimalToText(value))).toEqual([
      '46.37',
      '47.94',
      '-1.57',
    ]);
  });

  test('figures that subtract: stay as they are', () => {
    const result = roundDifference(
      { value: 46.43, u: 0.4 },
      { value: 47.92, u: 0.5 },
      { value: -1.49, u: 0.7 },
      rule,
    );

    expect(result.morePlaces).toBe(0);
    expect(decimalToText(result.difference.value)).toBe('-1.5');
  });

  test('places that differ: must agree in the coarsest', () => {
    const result = roundDifference(
      { value: 46.43, u: 0.4 },
      { value: 47.921, u: 0.013 },
      { value: -1.491, u: 0.4 },
      rule,
    );

    expect(result.morePlaces).toBe(0);
  });
});
