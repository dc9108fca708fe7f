import { at } from '#shared/numeric/element.ts';
import { confidenceBand } from './confidence-band.ts';

/**
 * Standard uncertainty of one more observation, point by point: that of the curve and that of the reading.
 *
 * Formula: u² = gᵀCg + σ². Source: N. R. Draper, H. Smith, Applied Regression Analysis, 3rd ed., section 3.1.
 *
 * @param derivatives - ∂f/∂pⱼ at the points, k columns of length n
 * @param covariance - C, k × k, row-major
 * @param sigmas - standard uncertainty of a single observation at each point, length n
 * @returns u, length n, k = 1
 * @throws RangeError when lengths differ
 * @example predictionBand([Float64Array.of(1)], Float64Array.of(9), Float64Array.of(4))[0] // => 5
 */
export function predictionBand(
  derivatives: readonly Float64Array[],
  covariance: Float64Array,
  sigmas: Float64Array,
): Float64Array {
  const curve = confidenceBand(derivatives, covariance);
  if (sigmas.length !== curve.length)
    throw new RangeError(`predictionBand: needs ${curve.length} sigmas, got ${sigmas.length}`);
  return curve.map((u, i) => Math.hypot(u, at(sigmas, i)));
}
