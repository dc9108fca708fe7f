import { at } from './element.ts';

/** A factor L with L·Lᵀ = A, or the row at which A turned out to have a negative direction. */
export type CholeskyOutcome =
  | { readonly status: 'factored'; readonly factor: Float64Array }
  | { readonly status: 'not positive'; readonly row: number };

/** A pivot this small beside its diagonal element is rounding: the row depends on those before it. */
const PIVOT_FLOOR = 1e-14;

/**
 * Cholesky factor of a covariance matrix.
 *
 * Formula: A = L·Lᵀ with L lower triangular. Where a row depends on those before it (two quantities fully
 * correlated, or one known exactly) its diagonal element is zero, so semi-definite matrices are accepted.
 * Source: G. H. Golub, C. F. Van Loan, Matrix Computations, 4th ed., algorithm 4.2.1 and section 4.2.8.
 *
 * @param matrix - A, size × size, row-major, symmetric (only its lower half is read)
 * @param size - number of rows ≥ 0
 * @returns the factor L (size × size, row-major, zeros above the diagonal), or the row that makes A indefinite
 * @throws RangeError when the matrix does not hold size × size elements
 * @example cholesky(Float64Array.of(4, 2, 2, 5), 2).factor[2] // => 1
 */
export function cholesky(matrix: Float64Array, size: number): CholeskyOutcome {
  if (matrix.length !== size * size)
    throw new RangeError(`cholesky: needs ${size * size} elements, got ${matrix.length}`);
  const factor = new Float64Array(size * size);
  for (let column = 0; column < size; column++) {
    const diagonal = at(matrix, column * size + column);
    const pivot = diagonal - dotOfRows(factor, size, column, column, column);
    if (Number.isNaN(pivot) || pivot < -PIVOT_FLOOR * Math.abs(diagonal) || diagonal < 0)
      return { status: 'not positive', row: column };
    const root = pivot > PIVOT_FLOOR * diagonal ? Math.sqrt(pivot) : 0;
    factor[column * size + column] = root;
    for (let row = column + 1; row < size; row++) {
      const rest = at(matrix, row * size + column) - dotOfRows(factor, size, row, column, column);
      const allowed = Math.sqrt(Math.abs(diagonal * at(matrix, row * size + row)));
      // A free direction may not be correlated with anything: otherwise no covariance matrix looks like this.
      if (root === 0 && Math.abs(rest) > 1e-7 * allowed) return { status: 'not positive', row };
      factor[row * size + column] = root === 0 ? 0 : rest / root;
    }
  }
  return { status: 'factored', factor };
}

/** Σ of products of the first `count` elements of two rows. */
function dotOfRows(factor: Float64Array, size: number, a: number, b: number, count: number): number {
  let total = 0;
  for (let k = 0; k < count; k++) total += at(factor, a * size + k) * at(factor, b * size + k);
  return total;
}
