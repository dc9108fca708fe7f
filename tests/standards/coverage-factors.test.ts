import { describe, expect, test } from 'vitest';
import { coverageFactor } from '#shared/statistics/coverage-factor.ts';
import { effectiveDegreesOfFreedom } from '#shared/statistics/effective-degrees-of-freedom.ts';

/*
 * JCGM 100:2008, table G.2: values of t_p(ν) for p = 68.27 %, 95 % and 99 %, as printed (two decimals) and with the
 * four decimals of an independent computation.
 */
describe('coverage factor, for the degrees of freedom of table G.2, gives the printed t', () => {
  test.each([
    [1, 1.84, 12.71, 63.66],
    [2, 1.32, 4.3, 9.92],
    [3, 1.2, 3.18, 5.84],
    [4, 1.14, 2.78, 4.6],
    [5, 1.11, 2.57, 4.03],
    [6, 1.09, 2.45, 3.71],
    [7, 1.08, 2.36, 3.5],
    [8, 1.07, 2.31, 3.36],
    [9, 1.06, 2.26, 3.25],
    [10, 1.05, 2.23, 3.17],
    [16, 1.03, 2.12, 2.92],
    [20, 1.03, 2.09, 2.85],
    [50, 1.01, 2.01, 2.68],
    [Infinity, 1, 1.96, 2.576],
  ])('ν = %d: %d, %d, %d', (degreesOfFreedom, at68, at95, at99) => {
    expect(Number(coverageFactor(0.6827, degreesOfFreedom).toFixed(2))).toBe(at68);
    expect(Number(coverageFactor(0.95, degreesOfFreedom).toFixed(2))).toBe(at95);
    expect(
      Number(coverageFactor(0.99, degreesOfFreedom).toFixed(degreesOfFreedom === Infinity ? 3 : 2)),
    ).toBe(at99);
  });

  test.each([
    [1, 1.8374, 12.7062, 63.6567],
    [2, 1.3213, 4.3027, 9.9248],
    [3, 1.1969, 3.1824, 5.8409],
    [4, 1.1417, 2.7764, 4.6041],
    [5, 1.1105, 2.5706, 4.0321],
    [8, 1.0666, 2.306, 3.3554],
  ])('ν = %d, four decimals: %d, %d, %d', (degreesOfFreedom, at68, at95, at99) => {
    const factors = [0.6827, 0.95, 0.99].map((level) =>
      Number(coverageFactor(level, degreesOfFreedom).toFixed(4)),
    );

    expect(factors).toEqual([at68, at95, at99]);
  });
});

// JCGM 100:2008, H.1.6: components of the end-gauge calibration in nm with their degrees of freedom.
test('effective degrees of freedom, for the components of H.1, are 16.75', () => {
  const found = effectiveDegreesOfFreedom([
    { contribution: 25, degreesOfFreedom: 18 },
    { contribution: 9.681942, degreesOfFreedom: 25.6 },
    { contribution: 2.886751, degreesOfFreedom: 50 },
    { contribution: 16.598809, degreesOfFreedom: 2 },
  ]);

  expect(found).toAgreeTo(16.75, { digits: 3 });
});
