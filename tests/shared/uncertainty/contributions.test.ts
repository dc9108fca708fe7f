import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { combineContributions } from '#shared/uncertainty/combine-contributions.ts';
import { combinedDegreesOfFreedom } from '#shared/uncertainty/combined-degrees-of-freedom.ts';
import type { Contribution } from '#shared/uncertainty/contribution.ts';
import { correlatedContributions } from '#shared/uncertainty/correlated-contributions.ts';
import { covariance } from '#shared/uncertainty/covariance.ts';
import { expandedUncertainty } from '#shared/uncertainty/expanded-uncertainty.ts';
import { meanOfRepeats } from '#shared/uncertainty/mean-of-repeats.ts';
import { standardUncertainty } from '#shared/uncertainty/standard-uncertainty.ts';
import { statedUncertainty } from '#shared/uncertainty/stated-uncertainty.ts';
import { uncertaintyBudget } from '#shared/uncertainty/uncertainty-budget.ts';

const size = fc.double({ min: -1e6, max: 1e6, noNaN: true });
const contributions = fc
  .uniqueArray(fc.constantFrom('a', 'b', 'c', 'd', 'e'), { minLength: 1, maxLength: 5 })
  .chain((sources) => fc.tuple(...sources.map((source) => size.map((c): Contribution => ({ source, c })))));

describe('contributions', () => {
  test('law: x − x has no uncertainty left at all', () => {
    fc.assert(
      fc.property(contributions, (x) => {
        const zero = combineContributions([
          { derivative: 1, contributions: x },
          { derivative: -1, contributions: x },
        ]);

        expect(zero).toEqual([]);
        expect(standardUncertainty(zero)).toBe(0);
      }),
    );
  });

  test('law: the variance of a sum is the two variances and twice the covariance', () => {
    fc.assert(
      fc.property(contributions, contributions, (x, y) => {
        const sum = combineContributions([
          { derivative: 1, contributions: x },
          { derivative: 1, contributions: y },
        ]);

        const expected = standardUncertainty(x) ** 2 + standardUncertainty(y) ** 2 + 2 * covariance(x, y);
        const scale = standardUncertainty(x) ** 2 + standardUncertainty(y) ** 2;
        expect(Math.abs(standardUncertainty(sum) ** 2 - expected)).toBeLessThanOrEqual(1e-12 * scale);
      }),
    );
  });

  test('law: a source common to all of n readings does not average away', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 50 }),
        fc.double({ min: 1e-3, max: 1e3, noNaN: true }),
        (n, scale) => {
          const readings = Array.from({ length: n }, (_, i) => ({
            derivative: 1 / n,
            contributions: [
              { source: 'scale', c: scale },
              { source: `reading ${i}`, c: scale },
            ],
          }));

          const mean = combineContributions(readings);

          expect(mean.find(({ source }) => source === 'scale')?.c).toAgreeTo(scale, { digits: 12 });
          expect(standardUncertainty(mean)).toAgreeTo(scale * Math.sqrt(1 + 1 / n), { digits: 12 });
        },
      ),
    );
  });

  test('a covariance matrix, taken apart and put together: is the same matrix', () => {
    const matrix = Float64Array.of(4, 2, -1, 2, 10, 3, -1, 3, 6);

    const values = correlatedContributions(matrix, (j) => `s${j}`) ?? [];

    const again = values.flatMap((a) => values.map((b) => covariance(a, b)));
    again.forEach((element, i) => expect(element).toAgreeTo(matrix[i] ?? NaN, { digits: 14 }));
  });

  test('a matrix with a negative direction: is refused', () => {
    expect(correlatedContributions(Float64Array.of(1, 2, 2, 1), (j) => `s${j}`)).toBeNull();
  });

  test('a budget: shares add to 1, the largest first', () => {
    const budget = uncertaintyBudget([
      { source: 'rule', c: 3 },
      { source: 'fit', c: -4 },
    ]);

    expect(budget).toEqual([
      { source: 'fit', c: -4, share: 0.64 },
      { source: 'rule', c: 3, share: 0.36 },
    ]);
  });
});

describe('degrees of freedom', () => {
  test('two equal parts with 4 degrees each: 8 together', () => {
    const parts = [
      { source: 'a', c: 1 },
      { source: 'b', c: -1 },
    ];

    expect(combinedDegreesOfFreedom(parts, () => ({ degreesOfFreedom: 4 }))).toAgreeTo(8, { digits: 14 });
  });

  test('columns of one fit: count as one component', () => {
    const parts = [
      { source: 'fit:c:0', c: 1 },
      { source: 'fit:c:1', c: 1 },
    ];

    expect(combinedDegreesOfFreedom(parts, () => ({ degreesOfFreedom: 4, pool: 'fit:c' }))).toAgreeTo(4, {
      digits: 14,
    });
  });

  test('no limited part, or no part at all: infinite', () => {
    expect(combinedDegreesOfFreedom([{ source: 'a', c: 1 }], () => ({ degreesOfFreedom: Infinity }))).toBe(
      Infinity,
    );
    expect(combinedDegreesOfFreedom([], () => ({ degreesOfFreedom: 1 }))).toBe(Infinity);
  });
});

describe('statements and repeats', () => {
  test.each([
    ['rectangular', undefined, 1 / Math.sqrt(3)],
    ['triangular', undefined, 1 / Math.sqrt(6)],
    ['arcsine', undefined, 1 / Math.sqrt(2)],
    ['normal', 2, 0.5],
    ['normal', undefined, 1],
  ] as const)('half-width 1 of shape %s, k = %s', (shape, k, expected) => {
    expect(statedUncertainty(1, shape, k)).toAgreeTo(expected, { digits: 15 });
  });

  test('expanded uncertainty with 4 degrees of freedom at 95 %: k is 2.7764 (JCGM 100:2008, table G.2)', () => {
    expect(expandedUncertainty(1, 4.9, 0.95).k).toBeCloseTo(2.7764, 4);
  });

  test('expanded uncertainty at a level of 1 or below 1 degree of freedom: is refused', () => {
    expect(() => expandedUncertainty(1, 4, 1)).toThrow(RangeError);
    expect(() => expandedUncertainty(1, 0.5, 0.95)).toThrow(RangeError);
  });

  test('one reading: has a mean, but no scatter', () => {
    expect(meanOfRepeats([2])).toEqual({
      mean: 2,
      scatter: null,
      standardUncertainty: null,
      degreesOfFreedom: 0,
    });
    expect(() => meanOfRepeats([])).toThrow(RangeError);
  });
});
