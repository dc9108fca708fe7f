import { at } from '#shared/numeric/element.ts';
import { cholesky } from '#shared/numeric/cholesky.ts';
import type { Contribution } from './contribution.ts';

/**
 * Contributions of several values known by their covariance matrix: the columns of its Cholesky factor stand
 * for independent sources, so that every later covariance comes out right.
 *
 * Formula: V = L Lᵀ; value i has contribution L[i][j] from source j.
 * Source: JCGM 102:2011, 3.20 and C.4 (a covariance matrix and its factor).
 *
 * @param covariances - n × n, row-major, symmetric, positive semidefinite
 * @param source - names the source of column j
 * @returns for each value its contributions, zeros left out; null when the matrix is no covariance matrix
 * @example correlatedContributions(Float64Array.of(4, 2, 2, 10), (j) => `s${j}`)?.[1]?.map(({ c }) => c) // => [1, 3]
 */
export function correlatedContributions(
  covariances: Float64Array,
  source: (column: number) => string,
): Contribution[][] | null {
  const n = Math.round(Math.sqrt(covariances.length));
  if (n * n !== covariances.length)
    throw new RangeError(
      `correlatedContributions: needs a square matrix, got ${covariances.length} elements`,
    );
  const result = cholesky(covariances, n);
  if (result.status !== 'factored') return null;
  const { factor } = result;
  return Array.from({ length: n }, (_, i) =>
    Array.from({ length: i + 1 }, (_unused, j) => ({ source: source(j), c: at(factor, i * n + j) })).filter(
      ({ c }) => c !== 0,
    ),
  );
}
