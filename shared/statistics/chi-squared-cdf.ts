import { incompleteGamma } from './incomplete-gamma.ts';

/**
 * Cumulative distribution function of the chi-squared distribution, P(X ≤ x).
 *
 * Formula: P(ν/2, x/2). Source: NIST Digital Library of Mathematical Functions, 8.2.4.
 * Accuracy: relative 1e-12 down to 1e-300, against 20-digit values in tests/fixtures/distributions.
 *
 * @param x - value; the probability is 0 for x ≤ 0
 * @param degreesOfFreedom - ν > 0, not necessarily whole
 * @returns the probability; NaN outside the domain
 * @example chiSquaredCdf(0, 3) // => 0
 */
export function chiSquaredCdf(x: number, degreesOfFreedom: number): number {
  return incompleteGamma(degreesOfFreedom / 2, x < 0 ? 0 : x / 2).lower;
}
