import { describe, expect, test } from 'vitest';
import { goodnessOfFit } from '#shared/fitting/goodness-of-fit.ts';
import { straightLineBothErrors } from '#shared/fitting/straight-line-both-errors.ts';

/*
 * The ten points and weights (1/σ²) of D. York et al., Am. J. Phys. 72, 367 (2004), table I; the results with full
 * digits were recomputed by two independent algorithms. Errors are those of the u given, not scaled by √(S/8).
 */
const POINTS = {
  x: Float64Array.of(0, 0.9, 1.8, 2.6, 3.3, 4.4, 5.2, 6.1, 6.5, 7.4),
  y: Float64Array.of(5.9, 5.4, 4.4, 4.6, 3.5, 3.7, 2.8, 2.8, 2.4, 1.5),
  xSigmas: Float64Array.of(1000, 1000, 500, 800, 200, 80, 60, 20, 1.8, 1).map(
    (weight) => 1 / Math.sqrt(weight),
  ),
  ySigmas: Float64Array.of(1, 1.8, 4, 8, 20, 20, 70, 70, 100, 500).map((weight) => 1 / Math.sqrt(weight)),
};

describe('straight line with errors in both, on the published ten points', () => {
  const line = straightLineBothErrors(POINTS);
  if (line.status !== 'converged') throw new Error(line.status);

  test.each([
    ['slope', line.slope, -0.480533407446, 11],
    ['intercept', line.intercept, 5.479910224033, 12],
    ['slope error', line.slopeError, 0.057985009, 7],
    ['intercept error', line.interceptError, 0.294970735, 8],
    ['S', line.chiSquared, 11.866353194, 10],
  ])('%s %d agrees with %d to %i digits', (_name, found, published, digits) => {
    expect(found).toAgreeTo(published, { digits });
  });

  test('p-value 0.157 for 8 degrees of freedom', () => {
    expect(line.degreesOfFreedom).toBe(8);
    expect(Number(goodnessOfFit(line.chiSquared, line.degreesOfFreedom).pValue?.toFixed(3))).toBe(0.157);
  });
});
