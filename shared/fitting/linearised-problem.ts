import { at, item } from '#shared/numeric/element.ts';
import { norm } from '#shared/numeric/norm.ts';
import { applyTransposedQ, pivotedQr, type PivotedQr } from '#shared/numeric/pivoted-qr.ts';
import { solveUpper } from '#shared/numeric/upper-triangular.ts';

/** The problem as it looks from one point: r + J·δ, with J = Q·R in columns divided by their lengths. */
export interface Linearised {
  readonly qr: PivotedQr;
  /** Lengths of the columns of J, 1 for a column of zeros. */
  readonly scales: Float64Array;
  /** Leading part of Qᵀr, length k. */
  readonly projected: Float64Array;
  /** Columns of J that are independent to working precision. */
  readonly rank: number;
}

/**
 * Factors the derivatives at a point, each column scaled to length 1.
 *
 * @param columns - J, k columns of length n ≥ k
 * @param residuals - r, length n
 */
export function linearise(columns: readonly Float64Array[], residuals: Float64Array): Linearised {
  const scales = Float64Array.from(columns, (column) => norm(column) || 1);
  const scaled = columns.map((column, j) => column.map((value) => value / at(scales, j)));
  const qr = pivotedQr(scaled);
  return { qr, scales, projected: project(qr, residuals), rank: rankOf(qr) };
}

/**
 * Leading part of Qᵀr, length k.
 *
 * @param qr - factors of a matrix with n rows
 * @param residuals - r, length n
 */
export function project(qr: PivotedQr, residuals: Float64Array): Float64Array {
  const rotated = residuals.slice();
  applyTransposedQ(qr, rotated);
  return rotated.slice(0, qr.size);
}

/**
 * Gauss-Newton step δ that makes |r + J·δ| least.
 *
 * @param linearised - factors; parameters beyond their rank are left where they are
 * @param projected - leading part of Qᵀr, length k
 * @returns δ, length k, in the order of the parameters
 */
export function gaussNewtonStep({ qr, scales, rank }: Linearised, projected: Float64Array): Float64Array {
  const solution = solveUpper(qr.triangle, qr.size, projected, rank);
  const step = new Float64Array(qr.size);
  qr.order.forEach((index, position) => (step[index] = -at(solution, position) / at(scales, index)));
  return step;
}

/**
 * Rounding of a reflection grows with √n at worst; a diagonal element of R below this is noise. Justified by the
 * collinear columns in tests/shared/fitting/fit-least-squares.test.ts and by the NIST set Filip, which is of full rank.
 */
function rankOf({ size, rows, triangle }: PivotedQr): number {
  const first = Math.abs(at(triangle, 0));
  const floor = 4 * Number.EPSILON * Math.sqrt(rows) * size * first;
  let rank = 0;
  while (rank < size && Math.abs(at(triangle, rank * size + rank)) > floor) rank++;
  return rank;
}

/**
 * Indices of parameters that take part in a combination the data leave free, in increasing order.
 *
 * Each dependent column of J is a combination of the independent ones; those with a part of more than 1e-6 of it
 * (columns of length 1) belong to the combination.
 *
 * @param linearised - factors with rank below k
 */
export function undeterminedParameters({ qr, rank }: Linearised): number[] {
  const found = new Set<number>();
  for (let position = rank; position < qr.size; position++) {
    found.add(item(qr.order, position));
    const dependent = Float64Array.from({ length: rank }, (_, row) =>
      at(qr.triangle, row * qr.size + position),
    );
    solveUpper(qr.triangle, qr.size, dependent, rank).forEach((share, index) => {
      if (Math.abs(share) > 1e-6) found.add(item(qr.order, index));
    });
  }
  return [...found].sort((a, b) => a - b);
}
