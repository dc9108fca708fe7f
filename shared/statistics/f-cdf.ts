import { fTails } from './f-tails.ts';

/**
 * Cumulative distribution function of the F distribution, P(F ≤ x).
 *
 * Accuracy: relative 1e-12, against 20-digit values in tests/fixtures/distributions.
 *
 * @param x - ratio of two mean squares; the probability is 0 for x ≤ 0
 * @param dof1 - degrees of freedom of the numerator, > 0
 * @param dof2 - degrees of freedom of the denominator, > 0; Infinity allowed
 * @returns the probability; NaN outside the domain
 * @example fCdf(0, 2, 3) // => 0
 */
export function fCdf(x: number, dof1: number, dof2: number): number {
  return fTails(x, dof1, dof2).lower;
}
