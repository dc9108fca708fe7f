import { at, item } from '#shared/numeric/element.ts';

/**
 * Standard uncertainty of a fitted curve, point by point, from the covariance of its parameters.
 *
 * Formula: u²(f) = gᵀCg with g = ∂f/∂p; correlations between the parameters included.
 * Source: JCGM 100:2008, equation (13); H.3.4 for the straight line.
 *
 * @param derivatives - ∂f/∂pⱼ at the points, k columns of length n
 * @param covariance - C, k × k, row-major
 * @returns u(f), length n, k = 1
 * @throws RangeError when the covariance does not fit the columns
 * @example confidenceBand([Float64Array.of(2)], Float64Array.of(9))[0] // => 6
 */
export function confidenceBand(derivatives: readonly Float64Array[], covariance: Float64Array): Float64Array {
  const size = derivatives.length;
  if (covariance.length !== size * size)
    throw new RangeError(
      `confidenceBand: needs ${size * size} elements of covariance, got ${covariance.length}`,
    );
  const points = derivatives[0]?.length ?? 0;
  return Float64Array.from({ length: points }, (_, i) => {
    let variance = 0;
    for (let a = 0; a < size; a++)
      for (let b = 0; b < size; b++)
        variance += at(item(derivatives, a), i) * at(covariance, a * size + b) * at(item(derivatives, b), i);
    // Rounding may leave a variance that should be 0 a little below it.
    return Math.sqrt(Math.max(0, variance));
  });
}
