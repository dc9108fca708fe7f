import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { cholesky } from '#shared/numeric/cholesky.ts';
import { at } from '#shared/numeric/element.ts';

const SIZE = 3;
const square = fc
  /* Small whole numbers: among them many matrices of less than full rank. */
  .array(fc.integer({ min: -4, max: 4 }), { minLength: SIZE * SIZE, maxLength: SIZE * SIZE })
  .map((values) => Float64Array.from(values));

/** M·Mᵀ. */
function timesTransposed(matrix: Float64Array, size: number): Float64Array {
  return Float64Array.from({ length: size * size }, (_, index) => {
    const row = Math.floor(index / size) * size;
    const other = (index % size) * size;
    return Array.from({ length: size }, (_unused, k) => at(matrix, row + k) * at(matrix, other + k)).reduce(
      (total, value) => total + value,
    );
  });
}

describe('cholesky', () => {
  test('the factor times its transpose is the matrix', () => {
    fc.assert(
      fc.property(square, (root) => {
        const matrix = timesTransposed(root, SIZE);
        const outcome = cholesky(matrix, SIZE);
        if (outcome.status !== 'factored') return false;
        const largest = Math.max(...matrix);
        return timesTransposed(outcome.factor, SIZE).every(
          (value, index) => Math.abs(value - at(matrix, index)) <= 1e-6 * largest,
        );
      }),
    );
  });

  test('two quantities fully correlated: leave a zero on the diagonal', () => {
    const outcome = cholesky(Float64Array.of(4, 6, 6, 9), 2);

    expect(outcome.status === 'factored' && [...outcome.factor]).toEqual([2, 0, 3, 0]);
  });

  test('a quantity known exactly: has a row of zeros', () => {
    const outcome = cholesky(Float64Array.of(0, 0, 0, 9), 2);

    expect(outcome.status === 'factored' && [...outcome.factor]).toEqual([0, 0, 0, 3]);
  });

  test('a correlation beyond 1: is not positive', () => {
    expect(cholesky(Float64Array.of(1, 2, 2, 1), 2)).toEqual({ status: 'not positive', row: 1 });
  });

  test('a covariance with an exact quantity: is not positive', () => {
    expect(cholesky(Float64Array.of(0, 1, 1, 4), 2).status).toBe('not positive');
  });

  test('NaN: is not positive', () => {
    expect(cholesky(Float64Array.of(NaN), 1).status).toBe('not positive');
  });

  test('the wrong number of elements: is refused', () => {
    expect(() => cholesky(Float64Array.of(1, 2, 3), 2)).toThrow('cholesky: needs 4 elements, got 3');
  });
});
