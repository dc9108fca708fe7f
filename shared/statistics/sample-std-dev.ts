import { sumOfSquares } from './sum-of-squares.ts';

/**
 * Experimental standard deviation of repeated readings.
 *
 * Formula: s² = Σ(qᵢ − q̄)² / (n − 1). Source: JCGM 100:2008, equation (4).
 * Accuracy: 14 digits where the readings as doubles allow it; with a mean 10⁷ times the scatter, as many as
 * rounding of the readings leaves (see `doubleDoubleStdDev` for readings with their decimals).
 *
 * @param values - length n, all in one unit U
 * @returns s in U, or null when there are fewer than 2 values: one reading says nothing of scatter
 * @example sampleStdDev([1, 2, 6]).toFixed(9) // => '2.645751311'
 */
export function sampleStdDev(values: ArrayLike<number>): number | null {
  if (values.length < 2) return null;
  return Math.sqrt(sumOfSquares(values) / (values.length - 1));
}
