/** What is known at the point where a search ended. */
export interface FitPoint {
  /** Parameters, length k, in the order of the problem. */
  readonly parameters: Float64Array;
  /** Residuals (model − observed) / u, length n. */
  readonly residuals: Float64Array;
  /** Σ rᵢ². */
  readonly chiSquared: number;
  /** n − k. A parameter that ended on its bound still counts. */
  readonly degreesOfFreedom: number;
  /** Length k: true where a parameter ended on one of its bounds and would go beyond it. */
  readonly atBound: readonly boolean[];
  /** Steps taken. */
  readonly iterations: number;
  /** Times the residuals were computed. */
  readonly evaluations: number;
}

/** Least χ² was found and every parameter is determined. */
export interface ConvergedFit extends FitPoint {
  readonly status: 'converged';
  /**
   * (JᵀJ)⁻¹, k × k, row-major: the covariance of the parameters when the u given are believed (absolute
   * weights). For relative weights use `scaleCovariance`. Where `atBound` is true the row is what the data
   * would give without the bound.
   */
  readonly covariance: Float64Array;
  /** Square roots of the covariance's diagonal, length k. */
  readonly standardErrors: Float64Array;
  /** Condition number (ratio of the extreme diagonal elements of R) with columns scaled to length 1; above 1e8 the parameters are hard to tell apart. */
  readonly condition: number;
  /** True when the residuals are linear in the parameters, so that the solution is exact and does not depend on the start. */
  readonly linear: boolean;
}

/** The data leave one or more combinations of parameters free: χ² is least along a line or more. No covariance exists. */
export interface UndeterminedFit extends FitPoint {
  readonly status: 'not determined';
  /** Number of independent combinations that the data do determine, less than k. */
  readonly rank: number;
  /** Indices of parameters that take part in a combination the data leave free. */
  readonly undetermined: readonly number[];
}

/** The search used up its evaluations; the parameters are its best point so far and no covariance is given. */
export interface UnconvergedFit extends FitPoint {
  readonly status: 'not converged';
}

/** A residual or derivative was not finite where the search had to stand; nothing else is known. */
export interface NotFiniteFit {
  readonly status: 'not finite';
  /** At the start values, or later at the point given. */
  readonly where: 'start' | 'search';
  readonly what: 'residual' | 'derivative';
  /** Index of the first observation concerned. */
  readonly observation: number;
  readonly parameters: Float64Array;
}

/** Fewer observations than parameters; nothing was computed. */
export interface TooFewObservations {
  readonly status: 'too few observations';
  readonly observations: number;
  readonly needed: number;
}

/** How a fit ended. Only 'converged' carries a covariance. */
export type FitOutcome = ConvergedFit | UndeterminedFit | UnconvergedFit | NotFiniteFit | TooFewObservations;
