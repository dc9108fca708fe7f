import { describe, expect, test } from 'vitest';
import { weightedMean } from '#shared/statistics/weighted-mean.ts';

describe('weighted mean', () => {
  // Recomputed with SciPy from the same three readings 10.1(1), 10.3(2), 9.80(15).
  test('of three readings that disagree a little: value, u, χ² and Birge ratio', () => {
    const found = weightedMean([10.1, 10.3, 9.8], [0.1, 0.2, 0.15]);

    expect(found.value).toAgreeTo(10.0508196721, { digits: 11 });
    expect(found.standardUncertainty).toAgreeTo(0.076822128, { digits: 9 });
    expect(found.chiSquared).toAgreeTo(4.5901639344, { digits: 10 });
    expect(found.birgeRatio).toAgreeTo(1.5149527937, { digits: 10 });
    expect(found.degreesOfFreedom).toBe(2);
    expect(found.pValue).toAgreeTo(Math.exp(-4.5901639344 / 2), { digits: 10 });
  });

  test('of one reading: is that reading, with no consistency to speak of', () => {
    expect(weightedMean([4], [0.5])).toEqual({
      value: 4,
      standardUncertainty: 0.5,
      chiSquared: 0,
      degreesOfFreedom: 0,
      birgeRatio: null,
      pValue: null,
    });
  });

  test.each([
    ['no reading', [], [], 'weightedMean: needs at least 1 value, got 0'],
    ['lengths that differ', [1, 2], [1], 'weightedMean: needs equal lengths, got 2 and 1'],
    ['a sigma of zero', [1], [0], 'weightedMean: needs sigmas that are finite and > 0, got 0'],
    ['a negative sigma', [1], [-1], 'weightedMean: needs sigmas that are finite and > 0, got -1'],
    [
      'an infinite sigma',
      [1],
      [Infinity],
      'weightedMean: needs sigmas that are finite and > 0, got Infinity',
    ],
  ])('with %s: is refused', (_case, values, sigmas, message) => {
    expect(() => weightedMean(values, sigmas)).toThrow(message);
  });
});
