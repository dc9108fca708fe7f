/** One free parameter of a fit: where the search starts and, if it is confined, between which values. */
export interface FitParameter {
  readonly start: number;
  /** Smallest value allowed; absent means none. */
  readonly min?: number | undefined;
  /** Largest value allowed; absent means none. */
  readonly max?: number | undefined;
}

/**
 * A sum of squares to be made least: χ²(p) = Σ rᵢ(p)².
 *
 * A residual is (model − observed) / u, so it has no unit; parameters may be in any one unit each.
 */
export interface LeastSquaresProblem {
  /** Number of residuals, n ≥ 1. */
  readonly observations: number;
  /** Free parameters, length k ≥ 1. */
  readonly parameters: readonly FitParameter[];
  /**
   * Writes the residuals at p into `out` (length n). A value that cannot be had is written as NaN; the search
   * then keeps away from there. Must not modify p.
   */
  readonly residuals: (p: Float64Array, out: Float64Array) => void;
  /** Writes ∂rᵢ/∂pⱼ at p into `columns[j][i]` (k columns of length n). Must not modify p. */
  readonly jacobian: (p: Float64Array, columns: readonly Float64Array[]) => void;
}

/** Options of a fit. */
export interface FitOptions {
  /** Most evaluations of the residuals before the search gives up, ≥ 1. Default 2000. */
  readonly maxEvaluations?: number | undefined;
}

/** Default of FitOptions.maxEvaluations: the slowest NIST set (Bennett5, from its far start) needs 770. */
const MAX_EVALUATIONS = 2000;

/**
 * Refuses a problem that no data could mend; gives the options with their defaults.
 *
 * @throws RangeError when a count, start, bound or option is not usable
 */
export function checkProblem(problem: LeastSquaresProblem, options: FitOptions): { maxEvaluations: number } {
  const { observations, parameters } = problem;
  if (!Number.isInteger(observations) || observations < 1)
    throw new RangeError(`fitLeastSquares: needs at least 1 observation, got ${observations}`);
  if (parameters.length === 0) throw new RangeError('fitLeastSquares: needs at least 1 parameter, got 0');
  parameters.forEach(({ start, min = -Infinity, max = Infinity }, index) => {
    if (!Number.isFinite(start))
      throw new RangeError(`fitLeastSquares: needs finite starts, got ${start} for parameter ${index}`);
    if (!(min < max))
      throw new RangeError(`fitLeastSquares: needs min < max, got ${min} and ${max} for parameter ${index}`);
    if (!(start >= min && start <= max))
      throw new RangeError(
        `fitLeastSquares: needs a start within ${min} and ${max}, got ${start} for parameter ${index}`,
      );
  });
  const maxEvaluations = options.maxEvaluations ?? MAX_EVALUATIONS;
  if (!(maxEvaluations >= 1))
    throw new RangeError(`fitLeastSquares: needs maxEvaluations ≥ 1, got ${maxEvaluations}`);
  return { maxEvaluations };
}
