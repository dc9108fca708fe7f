import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { at, item } from '#shared/numeric/element.ts';
import { leastSquaresCovariance } from '#shared/numeric/least-squares-covariance.ts';
import { norm } from '#shared/numeric/norm.ts';
import { applyTransposedQ, pivotedQr } from '#shared/numeric/pivoted-qr.ts';
import {
  invertUpper,
  multiplyUpper,
  solveUpper,
  solveUpperTransposed,
} from '#shared/numeric/upper-triangular.ts';

const element = fc.double({ min: -100, max: 100, noNaN: true });
const matrix = fc
  .integer({ min: 1, max: 5 })
  .chain((size) =>
    fc.array(fc.array(element, { minLength: 7, maxLength: 7 }), { minLength: size, maxLength: size }),
  )
  .map((columns) => columns.map((column) => Float64Array.from(column)));

function copy(columns: readonly Float64Array[]): Float64Array[] {
  return columns.map((column) => column.slice());
}

describe('pivoted QR', () => {
  test('Qᵀ times a column of A is the column of R', () => {
    fc.assert(
      fc.property(matrix, (columns) => {
        const qr = pivotedQr(copy(columns));
        return qr.order.every((index, position) => {
          const rotated = item(columns, index).slice();
          const length = norm(rotated);
          applyTransposedQ(qr, rotated);
          return rotated.every((value, row) => {
            const expected = row < qr.size ? at(qr.triangle, row * qr.size + position) : 0;
            return Math.abs(value - expected) <= 1e-13 * (length + 1e-300);
          });
        });
      }),
    );
  });

  test('the diagonal of R does not grow', () => {
    fc.assert(
      fc.property(matrix, (columns) => {
        const { triangle, size } = pivotedQr(copy(columns));
        const diagonal = Array.from({ length: size }, (_, j) => Math.abs(at(triangle, j * size + j)));
        return diagonal.every((value, j) => j === 0 || value <= item(diagonal, j - 1) * (1 + 1e-7) + 1e-12);
      }),
    );
  });

  test('two equal columns: leave nothing on the last diagonal element', () => {
    const column = Float64Array.of(1, 2, 3, 4);

    const { triangle } = pivotedQr(copy([column, column]));

    expect(Math.abs(at(triangle, 3))).toBeLessThan(1e-14);
  });

  test('columns of zeros: are factored without NaN', () => {
    const { triangle } = pivotedQr([new Float64Array(3), Float64Array.of(0, 2, 0)]);

    expect([...triangle]).toEqual([-2, 0, 0, 0].map((value) => expect.closeTo(value, 12)));
  });

  test('fewer rows than columns: is refused', () => {
    expect(() => pivotedQr([Float64Array.of(1), Float64Array.of(2)])).toThrow(RangeError);
  });

  test('columns of different lengths: are refused', () => {
    expect(() => pivotedQr([Float64Array.of(1, 2), Float64Array.of(2)])).toThrow(RangeError);
  });
});

describe('least-squares covariance', () => {
  test('of two columns: is the inverse of their products, in their order and units', () => {
    // AᵀA = [[4, 6], [6, 14]] for columns (1,1,1,1) and (0,1,2,3); its inverse is [[14, -6], [-6, 4]] / 20.
    const columns = [Float64Array.of(1, 1, 1, 1), Float64Array.of(0, 1, 2, 3)];
    const scales = Float64Array.of(2, 3);
    const scaled = columns.map((column, j) => column.map((value) => value / at(scales, j)));

    const covariance = leastSquaresCovariance(pivotedQr(scaled), scales);

    expect([...covariance]).toEqual([0.7, -0.3, -0.3, 0.2].map((value) => expect.closeTo(value, 14)));
  });
});

describe('upper triangular systems', () => {
  const triangle = Float64Array.of(2, 1, -1, 0, 4, 3, 0, 0, 5);

  test('R·x solved gives x back', () => {
    const product = multiplyUpper(triangle, 3, Float64Array.of(1, 2, 3));

    expect([...solveUpper(triangle, 3, product)]).toEqual(
      [1, 2, 3].map((value) => expect.closeTo(value, 14)),
    );
  });

  test('Rᵀ·x solved gives x back', () => {
    // Rᵀ·(1, 2, 3) worked out by hand.
    const solved = solveUpperTransposed(triangle, 3, Float64Array.of(2, 9, 20));

    expect([...solved]).toEqual([1, 2, 3].map((value) => expect.closeTo(value, 14)));
  });

  test('the leading part alone leaves the rest at 0', () => {
    expect([...solveUpper(triangle, 3, Float64Array.of(4, 8, 7), 2)]).toEqual([1, 2, 0]);
  });

  test('R⁻¹·R is the unit matrix', () => {
    const inverse = invertUpper(triangle, 3);
    const column = Float64Array.of(at(triangle, 2), at(triangle, 5), at(triangle, 8));

    expect([...multiplyUpper(inverse, 3, column)]).toEqual(
      [0, 0, 1].map((value) => expect.closeTo(value, 14)),
    );
  });
});
