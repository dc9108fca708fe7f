import { norm } from '#shared/numeric/norm.ts';
import type { LeastSquaresProblem } from './least-squares-problem.ts';

/** A place in the space of parameters with its residuals. */
export interface Point {
  readonly parameters: Float64Array;
  readonly residuals: Float64Array;
  /** √χ²; Infinity where a residual is not finite. */
  readonly length: number;
}

/** A problem with a count of what it has cost; every result is a fresh array. */
export interface Evaluator {
  readonly pointAt: (parameters: Float64Array) => Point;
  /** Derivatives at a point, or the first observation whose derivative is not finite. */
  readonly jacobianAt: (parameters: Float64Array) => Jacobian;
  readonly evaluations: () => number;
}

/** k columns of length n, or where they fail. */
export type Jacobian =
  | { readonly finite: true; readonly columns: readonly Float64Array[] }
  | { readonly finite: false; readonly observation: number };

/**
 * Wraps a problem for the search.
 *
 * @param problem - a checked problem
 * @returns functions that compute points and derivatives and count the points
 */
export function createEvaluator(problem: LeastSquaresProblem): Evaluator {
  let count = 0;
  return {
    pointAt(parameters) {
      const residuals = new Float64Array(problem.observations);
      problem.residuals(parameters, residuals);
      count++;
      const length = norm(residuals);
      return { parameters, residuals, length: Number.isFinite(length) ? length : Infinity };
    },
    jacobianAt(parameters) {
      const columns = problem.parameters.map(() => new Float64Array(problem.observations));
      problem.jacobian(parameters, columns);
      const bad = columns.map(firstNotFinite).filter((row) => row >= 0);
      return bad.length === 0 ? { finite: true, columns } : { finite: false, observation: Math.min(...bad) };
    },
    evaluations: () => count,
  };
}

/**
 * Index of the first element that is infinite or not a number, −1 when there is none.
 *
 * @param values - length n
 */
export function firstNotFinite(values: Float64Array): number {
  return values.findIndex((value) => !Number.isFinite(value));
}
