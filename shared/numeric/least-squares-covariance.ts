import { at, item } from './element.ts';
import { invertUpper } from './upper-triangular.ts';
import type { PivotedQr } from './pivoted-qr.ts';

/**
 * Unscaled covariance (AᵀA)⁻¹ of a least-squares solution from the QR factors of A.
 *
 * Formula: (AᵀA)⁻¹ = P·R⁻¹·R⁻ᵀ·Pᵀ, so the normal matrix, whose condition is that of A squared, is never formed.
 *
 * @param qr - factors of A of full rank, k columns, each divided by its scale beforehand
 * @param scales - length k, what each column of A was divided by
 * @returns k × k, row-major, symmetric, in the order and the units of the columns before scaling
 */
export function leastSquaresCovariance(qr: PivotedQr, scales: Float64Array): Float64Array {
  const { size, order } = qr;
  const inverse = invertUpper(qr.triangle, size);
  const covariance = new Float64Array(size * size);
  for (let a = 0; a < size; a++) {
    for (let b = a; b < size; b++) {
      let total = 0;
      for (let k = b; k < size; k++) total += at(inverse, a * size + k) * at(inverse, b * size + k);
      const row = item(order, a);
      const column = item(order, b);
      const value = total / at(scales, row) / at(scales, column);
      covariance[row * size + column] = value;
      covariance[column * size + row] = value;
    }
  }
  return covariance;
}
