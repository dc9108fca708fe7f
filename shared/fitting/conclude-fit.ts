import { at, item } from '#shared/numeric/element.ts';
import { leastSquaresCovariance } from '#shared/numeric/least-squares-covariance.ts';
import { norm } from '#shared/numeric/norm.ts';
import { gradientOf, pressedOnBound, type Bounds } from './bounds.ts';
import type { Evaluator, Point } from './evaluator.ts';
import type { FitOutcome, FitPoint } from './fit-outcome.ts';
import { gaussNewtonStep, linearise, undeterminedParameters } from './linearised-problem.ts';

/** Share of χ² that a further step would gain, below which the minimum is reached. */
const GAIN_LEFT = 1e-8;

/** Or: relative size of that step, for data without noise, where χ² itself is only rounding. */
const STEP_LEFT = 1e-8;

/**
 * Says how a fit ended, from the derivatives at its last point.
 *
 * @param evaluator - the problem
 * @param point - where the search ended
 * @param bounds - box
 * @param iterations - steps taken
 * @param linear - true when the point is the exact solution of a linear problem
 */
export function concludeFit(
  evaluator: Evaluator,
  point: Point,
  bounds: Bounds,
  iterations: number,
  linear: boolean,
): FitOutcome {
  const { parameters, residuals } = point;
  const jacobian = evaluator.jacobianAt(parameters);
  if (!jacobian.finite)
    return {
      status: 'not finite',
      where: 'search',
      what: 'derivative',
      observation: jacobian.observation,
      parameters,
    };
  const { columns } = jacobian;
  const atBound = pressedOnBound(parameters, gradientOf(columns, residuals), bounds);
  const end: FitPoint = {
    parameters,
    residuals,
    chiSquared: point.length ** 2,
    degreesOfFreedom: residuals.length - parameters.length,
    atBound,
    iterations,
    evaluations: evaluator.evaluations(),
  };
  if (!linear && !isStationary(columns, point, atBound)) return { ...end, status: 'not converged' };
  const view = linearise(columns, residuals);
  const size = parameters.length;
  if (view.rank < size)
    return { ...end, status: 'not determined', rank: view.rank, undetermined: undeterminedParameters(view) };
  const covariance = leastSquaresCovariance(view.qr, view.scales);
  const { triangle } = view.qr;
  return {
    ...end,
    status: 'converged',
    covariance,
    standardErrors: Float64Array.from(parameters, (_, j) => Math.sqrt(at(covariance, j * size + j))),
    condition: Math.abs(at(triangle, 0) / at(triangle, size * size - 1)),
    linear,
  };
}

/**
 * Whether χ² is least here as far as the parameters off their bounds go.
 *
 * The gain criterion is the relative offset of D. M. Bates, D. G. Watts, Technometrics 23, 179 (1981): the part of
 * the residuals that lies in the plane of the derivatives, beside the whole of them.
 */
function isStationary(columns: readonly Float64Array[], point: Point, atBound: readonly boolean[]): boolean {
  if (point.length === 0) return true;
  const free = [...columns.keys()].filter((index) => !item(atBound, index));
  if (free.length === 0) return true;
  const view = linearise(
    free.map((index) => item(columns, index)),
    point.residuals,
  );
  if (norm(view.projected.subarray(0, view.rank)) ** 2 <= GAIN_LEFT * point.length ** 2) return true;
  const step = gaussNewtonStep(view, view.projected);
  const here = Float64Array.from(free, (index) => at(point.parameters, index));
  return scaledNorm(step, view.scales) <= STEP_LEFT * scaledNorm(here, view.scales);
}

function scaledNorm(vector: Float64Array, scales: Float64Array): number {
  return norm(vector.map((value, j) => value * at(scales, j)));
}
