import { chiSquaredUpperTail } from '#shared/statistics/chi-squared-upper-tail.ts';

/** How well a fit agrees with the uncertainties given. */
export interface GoodnessOfFit {
  /** P(χ² or more) if model and uncertainties are right: small means they disagree, close to 1 bars too wide. */
  readonly pValue: number | null;
  /** χ²/ν. */
  readonly reducedChiSquared: number | null;
}

/**
 * Goodness of a fit with absolute weights.
 *
 * Formula: p = Q(ν/2, χ²/2). Meaningless for relative weights, which make χ²/ν equal to 1 by choice.
 * Source: K. Pearson, Philosophical Magazine 50, 157 (1900).
 *
 * @param chiSquared - least χ² ≥ 0
 * @param degreesOfFreedom - ν ≥ 0
 * @returns both figures; null each when ν = 0, because then every model fits
 * @throws RangeError when an argument is negative or NaN
 * @example goodnessOfFit(4, 2).reducedChiSquared // => 2
 */
export function goodnessOfFit(chiSquared: number, degreesOfFreedom: number): GoodnessOfFit {
  if (!(chiSquared >= 0) || !(degreesOfFreedom >= 0))
    throw new RangeError(`goodnessOfFit: needs values ≥ 0, got ${chiSquared} and ${degreesOfFreedom}`);
  if (degreesOfFreedom === 0) return { pValue: null, reducedChiSquared: null };
  return {
    pValue: chiSquaredUpperTail(chiSquared, degreesOfFreedom),
    reducedChiSquared: chiSquared / degreesOfFreedom,
  };
}
