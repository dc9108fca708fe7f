import { at, item } from './element.ts';
import { norm } from './norm.ts';

/** Q·R = A·P: reflectors, triangle and order of the columns. */
export interface PivotedQr {
  /** Number of rows n and of columns k of A, n ≥ k. */
  readonly rows: number;
  readonly size: number;
  /** order[j] is the column of A that stands at position j. */
  readonly order: readonly number[];
  /** R, k × k, row-major, zeros below the diagonal; |diagonal| does not increase. */
  readonly triangle: Float64Array;
  /** Householder vectors, length n each, one for each position. */
  readonly reflectors: readonly Float64Array[];
}

/** 2⁻⁵²; a column norm that has lost half its digits by downdating is computed anew. */
const EPSILON = Number.EPSILON;

/**
 * QR factorisation with column pivoting by Householder reflections.
 *
 * At every step the column with the longest remainder is taken next, so the diagonal of R shows how many columns
 * are independent. Source: P. Businger, G. H. Golub, Numerische Mathematik 7, 269 (1965); the downdating of the
 * remaining lengths as in J. J. Moré, B. S. Garbow, K. E. Hillstrom, MINPACK-1 (1980), qrfac. Cost: 2nk² operations.
 *
 * @param columns - A as k columns of length n ≥ k; they are overwritten and become the reflectors
 * @returns the factors
 * @throws RangeError when a column's length differs from the others', or n < k
 * @example pivotedQr([Float64Array.of(3, 4), Float64Array.of(0, 10)]).order[0] // => 1
 */
export function pivotedQr(columns: readonly Float64Array[]): PivotedQr {
  const size = columns.length;
  const rows = columns[0]?.length ?? 0;
  if (columns.some((column) => column.length !== rows) || rows < size)
    throw new RangeError(
      `pivotedQr: needs columns of one length ≥ ${size}, got ${columns.map((c) => c.length)}`,
    );
  const remaining = columns.map((column, index) => {
    const length = norm(column);
    return { column, index, length, reference: length };
  });
  const diagonal = new Float64Array(size);
  for (let j = 0; j < size; j++) {
    swapLongestTo(remaining, j);
    const reflector = item(remaining, j).column;
    diagonal[j] = makeReflector(reflector, j);
    if (diagonal[j] === 0) continue;
    for (let k = j + 1; k < size; k++) {
      const other = item(remaining, k);
      reflect(reflector, j, other.column);
      if (other.length === 0) continue;
      const lost = at(other.column, j) / other.length;
      other.length *= Math.sqrt(Math.max(0, 1 - lost * lost));
      if (0.05 * (other.length / other.reference) ** 2 <= EPSILON) {
        other.length = norm(other.column, j + 1);
        other.reference = other.length;
      }
    }
  }
  const reflectors = remaining.map((entry) => entry.column);
  return {
    rows,
    size,
    order: remaining.map((entry) => entry.index),
    triangle: collectTriangle(reflectors, diagonal),
    reflectors,
  };
}

/**
 * Replaces v by Qᵀv.
 *
 * @param qr - factors of a matrix with n rows
 * @param vector - v, length n; overwritten
 */
export function applyTransposedQ(qr: PivotedQr, vector: Float64Array): void {
  qr.reflectors.forEach((reflector, j) => {
    if (at(reflector, j) !== 0) reflect(reflector, j, vector);
  });
}

function swapLongestTo(remaining: { length: number }[], position: number): void {
  let longest = position;
  for (let k = position + 1; k < remaining.length; k++)
    if (item(remaining, k).length > item(remaining, longest).length) longest = k;
  const moved = item(remaining, longest);
  remaining[longest] = item(remaining, position);
  remaining[position] = moved;
}

/**
 * Turns the tail of a column into the vector w of the reflection I − w·wᵀ/w_j that maps the tail on the j-th
 * axis; returns the diagonal element of R, 0 when the tail is zero (no reflection then, w_j = 0).
 */
function makeReflector(column: Float64Array, j: number): number {
  const length = norm(column, j);
  if (length === 0) return 0;
  const signed = at(column, j) < 0 ? -length : length;
  for (let i = j; i < column.length; i++) column[i] = at(column, i) / signed;
  column[j] = at(column, j) + 1;
  return -signed;
}

function reflect(reflector: Float64Array, j: number, vector: Float64Array): void {
  let dot = 0;
  for (let i = j; i < vector.length; i++) dot += at(reflector, i) * at(vector, i);
  const factor = dot / at(reflector, j);
  for (let i = j; i < vector.length; i++) vector[i] = at(vector, i) - factor * at(reflector, i);
}

/** Above the diagonal R stands in the columns where the reflectors do not reach. */
function collectTriangle(reflectors: readonly Float64Array[], diagonal: Float64Array): Float64Array {
  const size = diagonal.length;
  const triangle = new Float64Array(size * size);
  for (let row = 0; row < size; row++) {
    triangle[row * size + row] = at(diagonal, row);
    for (let column = row + 1; column < size; column++)
      triangle[row * size + column] = at(item(reflectors, column), row);
  }
  return triangle;
}
