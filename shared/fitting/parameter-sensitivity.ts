import { at } from '#shared/numeric/element.ts';
import { gradientOf } from './bounds.ts';

/**
 * How fitted parameters move with a quantity s that shifts the residuals: an error common to all readings.
 *
 * Formula: dp/ds = −C·Jᵀ·∂r/∂s with C = (JᵀJ)⁻¹. Exact for problems linear in the parameters; otherwise without
 * the terms of second derivatives times residuals, which are small where the model fits.
 * Source: Y. Bard, Nonlinear Parameter Estimation (1974), section 7-5.
 *
 * @param jacobian - J = ∂r/∂p at the solution, k columns of length n
 * @param covariance - (JᵀJ)⁻¹, k × k, row-major, not scaled
 * @param residualDerivative - ∂r/∂s at the solution, length n
 * @returns dp/ds, length k
 * @throws RangeError when lengths differ
 * @example parameterSensitivity([Float64Array.of(1, 1)], Float64Array.of(0.5), Float64Array.of(-1, -1))[0] // => 1
 */
export function parameterSensitivity(
  jacobian: readonly Float64Array[],
  covariance: Float64Array,
  residualDerivative: Float64Array,
): Float64Array {
  const size = jacobian.length;
  if (covariance.length !== size * size)
    throw new RangeError(`parameterSensitivity: needs ${size * size} elements, got ${covariance.length}`);
  if (jacobian.some((column) => column.length !== residualDerivative.length))
    throw new RangeError(`parameterSensitivity: needs columns of length ${residualDerivative.length}`);
  const projected = gradientOf(jacobian, residualDerivative);
  return Float64Array.from(jacobian, (_, row) =>
    projected.reduce((total, value, column) => total - at(covariance, row * size + column) * value, 0),
  );
}
