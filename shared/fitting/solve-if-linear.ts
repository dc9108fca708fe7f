import { at, item } from '#shared/numeric/element.ts';
import { norm } from '#shared/numeric/norm.ts';
import { clampTo, type Bounds } from './bounds.ts';
import type { Evaluator, Jacobian, Point } from './evaluator.ts';
import { gaussNewtonStep, linearise, project, type Linearised } from './linearised-problem.ts';

/** Derivatives that agree to this share of their length are the same: rounding of their computation is smaller. */
const SAME_DERIVATIVES = 1e-12;

/** How far beyond the solution the derivatives are looked at once more, as a share of what the numbers are. */
const PROBE = 0.618;

/** Rounds of iterative refinement; each gains about as many digits as the condition leaves. */
const MAX_REFINEMENTS = 4;

/**
 * Solves a problem in one go if its residuals are linear in the parameters.
 *
 * Method: the residuals count as linear when the derivatives at the start, at the Gauss-Newton solution and at a
 * point beyond it agree; then that solution is exact, and is refined with the same factors.
 * Source of the refinement: G. H. Golub, J. H. Wilkinson, Numerische Mathematik 9, 139 (1966).
 *
 * @param evaluator - the problem
 * @param start - a point with finite residuals
 * @param bounds - box
 * @returns the solution; null when the problem is not linear, not of full rank, or its solution lies outside the box
 */
export function solveIfLinear(evaluator: Evaluator, start: Point, bounds: Bounds): Point | null {
  const jacobian = evaluator.jacobianAt(start.parameters);
  if (!jacobian.finite) return null;
  const view = linearise(jacobian.columns, start.residuals);
  if (view.rank < start.parameters.length) return null;
  const step = gaussNewtonStep(view, view.projected);
  const target = moved(start.parameters, step);
  if (!isInside(target, bounds)) return null;
  const probe = target.map((value, j) => value + (PROBE * (Math.abs(value) + Math.abs(at(step, j))) || 1));
  const places = [target, clampTo(probe, bounds)];
  if (!places.every((place) => sameDerivatives(jacobian.columns, evaluator.jacobianAt(place)))) return null;
  return refined(evaluator, view, evaluator.pointAt(target), bounds);
}

/** Repeats the step from where it led, as long as the steps shrink by half at least. */
function refined(evaluator: Evaluator, view: Linearised, first: Point, bounds: Bounds): Point | null {
  let point = first;
  let before = Infinity;
  for (let round = 0; round < MAX_REFINEMENTS; round++) {
    const step = gaussNewtonStep(view, project(view.qr, point.residuals));
    const size = norm(step.map((value, j) => value * at(view.scales, j)));
    const target = moved(point.parameters, step);
    if (!(size < before / 2) || size === 0 || !isInside(target, bounds)) break;
    point = evaluator.pointAt(target);
    before = size;
  }
  return Number.isFinite(point.length) ? point : null;
}

function moved(parameters: Float64Array, step: Float64Array): Float64Array {
  return parameters.map((value, j) => value + at(step, j));
}

function isInside(parameters: Float64Array, bounds: Bounds): boolean {
  return clampTo(parameters, bounds).every((value, j) => value === at(parameters, j));
}

function sameDerivatives(columns: readonly Float64Array[], other: Jacobian): boolean {
  if (!other.finite) return false;
  return columns.every((column, j) => {
    const difference = column.map((value, i) => value - at(item(other.columns, j), i));
    return norm(difference) <= SAME_DERIVATIVES * norm(column);
  });
}
