import { at } from './element.ts';

/**
 * Solution of R·x = b for an upper triangular R, of its leading part when the rest is to be left out.
 *
 * @param triangle - R, size × size, row-major
 * @param size - number of rows
 * @param right - b, length ≥ rank
 * @param rank - leading rows and columns to use, default size; the other x are 0
 * @returns x, length size; not finite when a diagonal element in use is 0
 * @example solveUpper(Float64Array.of(2, 1, 0, 4), 2, Float64Array.of(4, 8))[0] // => 1
 */
export function solveUpper(
  triangle: Float64Array,
  size: number,
  right: Float64Array,
  rank = size,
): Float64Array {
  const solution = new Float64Array(size);
  for (let row = rank - 1; row >= 0; row--) {
    let rest = at(right, row);
    for (let column = row + 1; column < rank; column++)
      rest -= at(triangle, row * size + column) * at(solution, column);
    solution[row] = rest / at(triangle, row * size + row);
  }
  return solution;
}

/**
 * Solution of Rᵀ·x = b for an upper triangular R.
 *
 * @param triangle - R, size × size, row-major
 * @param size - number of rows
 * @param right - b, length size
 * @returns x, length size; not finite when a diagonal element is 0
 * @example solveUpperTransposed(Float64Array.of(2, 1, 0, 4), 2, Float64Array.of(4, 6))[1] // => 1
 */
export function solveUpperTransposed(
  triangle: Float64Array,
  size: number,
  right: Float64Array,
): Float64Array {
  const solution = new Float64Array(size);
  for (let row = 0; row < size; row++) {
    let rest = at(right, row);
    for (let column = 0; column < row; column++)
      rest -= at(triangle, column * size + row) * at(solution, column);
    solution[row] = rest / at(triangle, row * size + row);
  }
  return solution;
}

/**
 * Product R·x for an upper triangular R.
 *
 * @param triangle - R, size × size, row-major
 * @param size - number of rows
 * @param vector - x, length size
 * @returns R·x, length size
 * @example multiplyUpper(Float64Array.of(2, 1, 0, 4), 2, Float64Array.of(1, 2))[0] // => 4
 */
export function multiplyUpper(triangle: Float64Array, size: number, vector: Float64Array): Float64Array {
  const product = new Float64Array(size);
  for (let row = 0; row < size; row++) {
    let total = 0;
    for (let column = row; column < size; column++)
      total += at(triangle, row * size + column) * at(vector, column);
    product[row] = total;
  }
  return product;
}

/**
 * Inverse of an upper triangular matrix.
 *
 * @param triangle - R, size × size, row-major, no zero on the diagonal
 * @param size - number of rows
 * @returns R⁻¹, size × size, row-major, upper triangular
 * @example invertUpper(Float64Array.of(2, 1, 0, 4), 2)[0] // => 0.5
 */
export function invertUpper(triangle: Float64Array, size: number): Float64Array {
  const inverse = new Float64Array(size * size);
  const unit = new Float64Array(size);
  for (let column = 0; column < size; column++) {
    unit.fill(0);
    unit[column] = 1;
    const solved = solveUpper(triangle, size, unit, column + 1);
    solved.forEach((value, row) => (inverse[row * size + column] = value));
  }
  return inverse;
}
