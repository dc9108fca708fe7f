import { fTails } from './f-tails.ts';

/**
 * Upper tail of the F distribution, P(F > x): the p-value of a variance ratio.
 *
 * Accuracy: relative 1e-12, against 20-digit values in tests/fixtures/distributions.
 *
 * @param x - ratio of two mean squares; the tail is 1 for x ≤ 0
 * @param dof1 - degrees of freedom of the numerator, > 0
 * @param dof2 - degrees of freedom of the denominator, > 0; Infinity allowed
 * @returns the probability; NaN outside the domain
 * @example fUpperTail(0, 2, 3) // => 1
 */
export function fUpperTail(x: number, dof1: number, dof2: number): number {
  return fTails(x, dof1, dof2).upper;
}
