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
  /** Most evaluations of the residuals before the search gives up. Default 2000. */
  readonly maxEvaluations?: number | undefined;
}
