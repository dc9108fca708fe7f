import { sum } from '#shared/numeric/sum.ts';

/**
 * Arithmetic mean.
 *
 * Formula: q̄ = Σ qᵢ / n, the sum corrected for rounding. Source: JCGM 100:2008, equation (3).
 *
 * @param values - length n ≥ 1, all in one unit U
 * @returns their mean in U
 * @throws RangeError when there is no value
 * @example mean([1, 2, 6]) // => 3
 */
export function mean(values: ArrayLike<number>): number {
  if (values.length === 0) throw new RangeError('mean: needs at least 1 value, got 0');
  return sum(Array.from(values)) / values.length;
}
