import { sum } from '#shared/numeric/sum.ts';
import { chiSquaredUpperTail } from './chi-squared-upper-tail.ts';

/** A weighted mean and whether the readings agree with one another within their uncertainties. */
export interface WeightedMean {
  readonly value: number;
  /** Standard uncertainty of the mean when the u given are believed. */
  readonly standardUncertainty: number;
  /** Σ ((xᵢ − m)/uᵢ)². */
  readonly chiSquared: number;
  readonly degreesOfFreedom: number;
  /** √(χ²/ν): above 1 the readings scatter more than their u say; null for one reading. */
  readonly birgeRatio: number | null;
  /** P(χ² or more) if the u are right; null for one reading. */
  readonly pValue: number | null;
}

/**
 * Mean of independent readings weighted by their inverse variances, with its consistency.
 *
 * Formula: m = Σ wᵢxᵢ / Σ wᵢ with wᵢ = 1/uᵢ²; u(m) = (Σ wᵢ)^(−½); Birge ratio √(χ²/ν).
 * Source: R. T. Birge, Phys. Rev. 40, 207 (1932). The uncertainty is not inflated: that is the reader's choice.
 *
 * @param values - readings, length n ≥ 1, all in one unit U
 * @param sigmas - their standard uncertainties, length n, in U, each finite and > 0
 * @returns the mean in U and the figures of its consistency
 * @throws RangeError when n = 0, lengths differ, or a sigma is not finite and positive
 * @example weightedMean([1, 3], [1, 1]).value // => 2
 */
export function weightedMean(values: ArrayLike<number>, sigmas: ArrayLike<number>): WeightedMean {
  if (values.length === 0) throw new RangeError('weightedMean: needs at least 1 value, got 0');
  if (values.length !== sigmas.length)
    throw new RangeError(`weightedMean: needs equal lengths, got ${values.length} and ${sigmas.length}`);
  const readings = Array.from(values);
  const weights = Array.from(sigmas, weightOf);
  const whole = sum(weights);
  // Deviations from the first reading keep the digits that a mean far from zero would cost.
  const origin = readings[0] ?? 0;
  const value = origin + sum(weights.map((w, i) => (w * ((readings[i] ?? NaN) - origin)) / whole));
  const chiSquared = sum(weights.map((w, i) => w * ((readings[i] ?? NaN) - value) ** 2));
  const degreesOfFreedom = readings.length - 1;
  return {
    value,
    standardUncertainty: 1 / Math.sqrt(whole),
    chiSquared,
    degreesOfFreedom,
    birgeRatio: degreesOfFreedom === 0 ? null : Math.sqrt(chiSquared / degreesOfFreedom),
    pValue: degreesOfFreedom === 0 ? null : chiSquaredUpperTail(chiSquared, degreesOfFreedom),
  };
}

function weightOf(sigma: number): number {
  if (!(sigma > 0 && sigma < Infinity))
    throw new RangeError(`weightedMean: needs sigmas that are finite and > 0, got ${sigma}`);
  return 1 / (sigma * sigma);
}
