import {
  ONE,
  ZERO,
  add,
  divide,
  fromNumber,
  multiply,
  negate,
  squareRoot,
  subtract,
  toNumber,
  type DoubleDouble,
} from './double-double.ts';
import { item } from './element.ts';

/** A linear least-squares solution, or why there is none. */
export type LinearSolution =
  | {
      readonly status: 'solved';
      /** Length k. */
      readonly coefficients: readonly number[];
      /** (AᵀA)⁻¹, k × k, row-major: the covariance for observations of unit variance. */
      readonly covariance: readonly number[];
      /** Σ (observed − A·coefficients)². */
      readonly residualSquares: number;
      /** n − k. */
      readonly degreesOfFreedom: number;
    }
  /** Column `column` is, to 30 digits, a combination of those before it. */
  | { readonly status: 'not determined'; readonly column: number }
  | { readonly status: 'too few observations'; readonly observations: number; readonly needed: number };

type Column = readonly DoubleDouble[];

/** Diagonal element of R beside the unit column it comes from: below it only rounding of 2⁻¹⁰⁰ is left. */
const RANK_TOLERANCE = 1e-26;

/**
 * Linear least squares in double-double arithmetic.
 *
 * Method: Householder QR of columns scaled to length 1, about 32 digits throughout, so that even a polynomial of
 * degree ten keeps its digits. With inputs that carry the exact decimals of the readings all NIST linear sets
 * come out at 14 digits. Source: G. H. Golub, Numerische Mathematik 7, 206 (1965).
 *
 * @param columns - A as k ≥ 1 columns of length n
 * @param observed - right side, length n
 * @returns coefficients with their unscaled covariance and the residual sum of squares
 * @throws RangeError when a length differs
 * @example doubleDoubleLeastSquares([[{ hi: 1, lo: 0 }, { hi: 1, lo: 0 }]], [{ hi: 1, lo: 0 }, { hi: 3, lo: 0 }]).coefficients[0] // => 2
 */
export function doubleDoubleLeastSquares(columns: readonly Column[], observed: Column): LinearSolution {
  const n = observed.length;
  const k = columns.length;
  if (k === 0 || columns.some((column) => column.length !== n))
    throw new RangeError(
      `doubleDoubleLeastSquares: needs columns of length ${n}, got ${columns.map((c) => c.length)}`,
    );
  if (n < k) return { status: 'too few observations', observations: n, needed: k };
  const scales = columns.map((column) => squareRoot(dot(column, column, 0)));
  const zeroColumn = scales.findIndex((scale) => scale.hi === 0);
  if (zeroColumn >= 0) return { status: 'not determined', column: zeroColumn };
  const working = columns.map((column, j) => column.map((value) => divide(value, item(scales, j))));
  const right = [...observed];
  const triangle = triangularise(working, right);
  const dependent = triangle.findIndex((row, j) => Math.abs(item(row, j).hi) < RANK_TOLERANCE);
  if (dependent >= 0) return { status: 'not determined', column: dependent };
  const tail = right.slice(k);
  return {
    status: 'solved',
    coefficients: backSubstitute(triangle, right).map((value, j) => toNumber(divide(value, item(scales, j)))),
    covariance: covarianceOf(triangle, scales),
    residualSquares: toNumber(dot(tail, tail, 0)),
    degreesOfFreedom: n - k,
  };
}

/** Reduces the columns by reflections, applies the same to the right side; returns R by rows (zeros below the diagonal). */
function triangularise(columns: DoubleDouble[][], right: DoubleDouble[]): DoubleDouble[][] {
  const triangle = columns.map(() => columns.map(() => ZERO));
  columns.forEach((column, j) => {
    const length = squareRoot(dot(column, column, j));
    if (length.hi === 0) return;
    const diagonal = item(column, j).hi > 0 ? negate(length) : length;
    const reflector = [...column];
    reflector[j] = subtract(item(reflector, j), diagonal);
    const half = divide(dot(reflector, reflector, j), fromNumber(2));
    const row = item(triangle, j);
    row[j] = diagonal;
    for (let k = j + 1; k < columns.length; k++) {
      const other = item(columns, k);
      reflect(reflector, half, j, other);
      row[k] = item(other, j);
    }
    reflect(reflector, half, j, right);
  });
  return triangle;
}

function reflect(reflector: Column, half: DoubleDouble, from: number, vector: DoubleDouble[]): void {
  const factor = divide(dot(reflector, vector, from), half);
  for (let i = from; i < vector.length; i++)
    vector[i] = subtract(item(vector, i), multiply(factor, item(reflector, i)));
}

function dot(a: Column, b: Column, from: number): DoubleDouble {
  let total = ZERO;
  for (let i = from; i < a.length; i++) total = add(total, multiply(item(a, i), item(b, i)));
  return total;
}

/** Solution of R·x = b; b may be longer than R. */
function backSubstitute(triangle: readonly Column[], right: Column): DoubleDouble[] {
  const solution: DoubleDouble[] = triangle.map(() => ZERO);
  for (let row = triangle.length - 1; row >= 0; row--) {
    const coefficients = item(triangle, row);
    let rest = item(right, row);
    for (let column = row + 1; column < triangle.length; column++)
      rest = subtract(rest, multiply(item(coefficients, column), item(solution, column)));
    solution[row] = divide(rest, item(coefficients, row));
  }
  return solution;
}

function covarianceOf(triangle: readonly Column[], scales: Column): number[] {
  const size = triangle.length;
  // Column m of R⁻¹ solves R·x = e_m.
  const inverse = triangle.map((_, m) =>
    backSubstitute(
      triangle,
      triangle.map((_row, i) => (i === m ? ONE : ZERO)),
    ),
  );
  const covariance: number[] = [];
  for (let a = 0; a < size; a++) {
    for (let b = 0; b < size; b++) {
      let total = ZERO;
      for (const column of inverse) total = add(total, multiply(item(column, a), item(column, b)));
      covariance.push(toNumber(divide(divide(total, item(scales, a)), item(scales, b))));
    }
  }
  return covariance;
}
