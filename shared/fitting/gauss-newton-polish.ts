import { at } from '#shared/numeric/element.ts';
import { gaussNewtonStep, linearise } from './linearised-problem.ts';
import type { Bounds } from './bounds.ts';
import { clampTo } from './bounds.ts';
import type { Evaluator, Point } from './evaluator.ts';

/** Undamped steps converge linearly on problems with large residuals: some NIST sets need 30 for the last digits. */
const MAX_STEPS = 40;

/** A step must be this much shorter than the one before, or the polish has reached the rounding. */
const SHRINK = 0.97;

/** A step longer than this share of a parameter means that the search had not ended near a minimum. */
const LARGEST_STEP = 0.1;

/** A step this small beside its parameter changes nothing more. */
const SMALLEST_STEP = 1e-13;

/** χ may grow by this share: near the minimum it no longer shows which of two points is better. */
const ALLOWED_GROWTH = 1e-9;

/**
 * Gauss-Newton steps after a search has settled: the search stops when χ² no longer changes, which leaves half of
 * the digits of the parameters to be had. A step is kept only when the one that would follow it is shorter, since
 * undamped steps lead away from a minimum whose residuals are large.
 *
 * @param evaluator - the problem
 * @param from - where the search settled
 * @param free - indices of the parameters that are not held on a bound
 * @param bounds - box that must not be left
 * @returns the last point kept, and the number of steps that led there
 */
export function gaussNewtonPolish(
  evaluator: Evaluator,
  from: Point,
  free: readonly number[],
  bounds: Bounds,
): { point: Point; steps: number } {
  let point = from;
  let step = free.length > 0 ? stepFrom(evaluator, point, free) : null;
  let steps = 0;
  while (step !== null && steps < MAX_STEPS) {
    const size = relativeSize(step, point.parameters);
    const target = moved(point.parameters, step);
    if (!(size > SMALLEST_STEP) || size > LARGEST_STEP || leaves(target, bounds)) break;
    const next = evaluator.pointAt(target);
    if (!(next.length <= from.length * (1 + ALLOWED_GROWTH))) break;
    const following = stepFrom(evaluator, next, free);
    if (following === null || !(relativeSize(following, target) < size * SHRINK)) break;
    point = next;
    step = following;
    steps++;
  }
  return { point, steps };
}

function moved(parameters: Float64Array, step: Float64Array): Float64Array {
  return parameters.map((value, j) => value + at(step, j));
}

/** Step over all parameters, zero for those that are held; null where there is none. */
function stepFrom(evaluator: Evaluator, point: Point, free: readonly number[]): Float64Array | null {
  const jacobian = evaluator.jacobianAt(point.parameters);
  if (!jacobian.finite) return null;
  const columns = jacobian.columns.filter((_, index) => free.includes(index));
  const view = linearise(columns, point.residuals);
  if (view.rank < free.length) return null;
  const step = new Float64Array(point.parameters.length);
  gaussNewtonStep(view, view.projected).forEach((value, j) => {
    const index = free[j];
    if (index !== undefined) step[index] = value;
  });
  return step;
}

/** Largest step beside its parameter. */
function relativeSize(step: Float64Array, parameters: Float64Array): number {
  return step.reduce(
    (most, value, j) => Math.max(most, Math.abs(value) / (Math.abs(at(parameters, j)) || 1)),
    0,
  );
}

function leaves(target: Float64Array, bounds: Bounds): boolean {
  return clampTo(target, bounds).some((value, j) => value !== at(target, j));
}
