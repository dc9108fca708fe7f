/**
 * Covariance for relative weights: the uncertainties given are believed up to one common factor, which the
 * scatter about the fit then sets.
 *
 * Formula: C · χ²/ν. Source: JCGM 100:2008, H.3.2 (equations H.13).
 *
 * @param covariance - (JᵀJ)⁻¹, k × k
 * @param chiSquared - least χ² ≥ 0
 * @param degreesOfFreedom - ν ≥ 0
 * @returns the scaled matrix, a new array; null when ν = 0, because then nothing is known of the scatter
 * @throws RangeError when an argument is negative or NaN
 * @example scaleCovariance(Float64Array.of(2), 6, 3)[0] // => 4
 */
export function scaleCovariance(
  covariance: Float64Array,
  chiSquared: number,
  degreesOfFreedom: number,
): Float64Array | null {
  if (!(chiSquared >= 0) || !(degreesOfFreedom >= 0))
    throw new RangeError(`scaleCovariance: needs values ≥ 0, got ${chiSquared} and ${degreesOfFreedom}`);
  if (degreesOfFreedom === 0) return null;
  return covariance.map((value) => (value * chiSquared) / degreesOfFreedom);
}
