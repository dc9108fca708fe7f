import { sum } from '#shared/numeric/sum.ts';
import { mean } from './mean.ts';

/**
 * Sum of squared deviations from the mean.
 *
 * Formula: Σ dᵢ² − (Σ dᵢ)²/n with dᵢ = qᵢ − q̄; the second term removes what rounding of q̄ leaves.
 * Source: T. F. Chan, G. H. Golub, R. J. LeVeque, The American Statistician 37, 242 (1983), equation (1.7).
 *
 * @param values - length n ≥ 1, all in one unit U
 * @returns the sum in U²
 * @throws RangeError when there is no value
 * @example sumOfSquares([1, 2, 6]) // => 14
 */
export function sumOfSquares(values: ArrayLike<number>): number {
  const centre = mean(values);
  const deviations = Array.from(values, (value) => value - centre);
  const left = sum(deviations);
  return sum(deviations.map((deviation) => deviation * deviation)) - (left * left) / values.length;
}
