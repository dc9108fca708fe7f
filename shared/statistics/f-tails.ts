import { incompleteBeta } from './incomplete-beta.ts';
import { incompleteGamma, type Tails } from './incomplete-gamma.ts';

/**
 * Both tails of the F distribution with ν₁ and ν₂ degrees of freedom.
 *
 * Formula: I_{w}(ν₁/2, ν₂/2) with w = ν₁x/(ν₁x + ν₂); chi-squared over ν where one of the two is infinite.
 * Source: NIST Digital Library of Mathematical Functions, 8.17.
 *
 * @param x - ratio of two mean squares; below 0 as 0
 * @param dof1 - ν₁ > 0
 * @param dof2 - ν₂ > 0; Infinity allowed
 * @returns P(F ≤ x) and P(F > x); both NaN outside the domain
 * @example fTails(0, 2, 3).upper // => 1
 */
export function fTails(x: number, dof1: number, dof2: number): Tails {
  if (x <= 0 && dof1 > 0 && dof2 > 0) return { lower: 0, upper: 1 };
  if (dof2 === Infinity) return incompleteGamma(dof1 / 2, (dof1 * x) / 2);
  const ratio = (dof1 / dof2) * x;
  return incompleteBeta(dof1 / 2, dof2 / 2, ratio === Infinity ? 1 : ratio / (1 + ratio), 1 / (1 + ratio));
}
