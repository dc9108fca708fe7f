import { describe, expect, test } from 'vitest';
import { doubleDoubleLeastSquares } from '#shared/numeric/double-double-least-squares.ts';
import { fromNumber, type DoubleDouble } from '#shared/numeric/double-double.ts';

const column = (...values: number[]): DoubleDouble[] => values.map(fromNumber);

describe('double-double least squares', () => {
  test('one column a multiple of another: is not determined, and says which', () => {
    const columns = [column(1, 1, 1), column(1, 2, 3), column(2, 4, 6)];

    expect(doubleDoubleLeastSquares(columns, column(1, 2, 2))).toEqual({
      status: 'not determined',
      column: 2,
    });
  });

  test('a column of zeros: is not determined', () => {
    expect(doubleDoubleLeastSquares([column(0, 0)], column(1, 2))).toEqual({
      status: 'not determined',
      column: 0,
    });
  });

  test('two observations for three coefficients: too few', () => {
    const columns = [column(1, 1), column(1, 2), column(1, 4)];

    expect(doubleDoubleLeastSquares(columns, column(1, 2))).toEqual({
      status: 'too few observations',
      observations: 2,
      needed: 3,
    });
  });

  test('columns of different lengths: are refused', () => {
    expect(() => doubleDoubleLeastSquares([column(1, 2), column(1)], column(1, 2))).toThrow(RangeError);
  });

  test('a parabola through three points: leaves no residual', () => {
    const columns = [column(1, 1, 1), column(1, 2, 3), column(1, 4, 9)];

    const solution = doubleDoubleLeastSquares(columns, column(6, 11, 18));

    expect(solution).toMatchObject({ status: 'solved', degreesOfFreedom: 0 });
    expect(solution.status === 'solved' && solution.coefficients).toEqual(
      [3, 2, 1].map((value) => expect.closeTo(value, 14)),
    );
  });
});
