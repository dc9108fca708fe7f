import { at, item } from '#shared/numeric/element.ts';
import { norm } from '#shared/numeric/norm.ts';
import { pivotedQr } from '#shared/numeric/pivoted-qr.ts';
import { clampTo, gradientOf, pressedOnBound, type Bounds } from './bounds.ts';
import { dampedStep, imageOf, type TriangularSystem } from './damped-step.ts';
import type { Evaluator, Point } from './evaluator.ts';
import { project } from './linearised-problem.ts';

/** Where a search ended, and why. */
export interface SearchEnd {
  readonly reason: 'settled' | 'out of evaluations' | 'derivative not finite';
  readonly point: Point;
  readonly iterations: number;
  /** First observation whose derivative is not finite, else −1. */
  readonly observation: number;
}

/** Relative change of χ and of the radius below which nothing is left to gain: a few units in the last place. */
const TOLERANCE = 1e-15;

/** First radius of trust, in lengths of the scaled start; the value of MINPACK's lmder1. */
const FIRST_RADIUS = 100;

/** A step is taken when it gains at least this share of what the linear picture promised. */
const WORTHWHILE = 1e-4;

/** The free part of the problem, linearised at one point. */
interface View {
  readonly system: TriangularSystem;
  /** Indices of the free parameters. */
  readonly free: readonly number[];
  readonly steepest: number;
}

/** A trial step and how it compares with its promise; reductions are shares of χ². */
interface Trial {
  readonly point: Point;
  readonly scaledLength: number;
  readonly actual: number;
  readonly predicted: number;
  /** Half the slope of χ² along the step, as a share of χ²; not negative when clamping to the bounds spoilt the step. */
  readonly slope: number;
}

/**
 * Levenberg-Marquardt search with bounds.
 *
 * Method: trust region with Moré's running maximum of column lengths as scales, the step from a pivoted QR
 * factorisation. Parameters on a bound that would go beyond it are held during a step; a step that leaves the box
 * is cut back into it component by component, and judged as it then is.
 * Source: J. J. Moré, Lecture Notes in Mathematics 630, 105 (1978); J. J. Moré, B. S. Garbow, K. E. Hillstrom,
 * MINPACK-1 (1980), lmder.
 *
 * @param evaluator - the problem
 * @param start - a point with finite residuals, inside the bounds
 * @param bounds - box
 * @param maxEvaluations - the search ends when the evaluator has counted as many
 */
export function levenbergMarquardt(
  evaluator: Evaluator,
  start: Point,
  bounds: Bounds,
  maxEvaluations: number,
): SearchEnd {
  const scales = new Float64Array(start.parameters.length);
  let point = start;
  let radius = 0;
  let damping = 0;
  let iterations = 0;
  const end = (reason: SearchEnd['reason'], observation = -1): SearchEnd => ({
    reason,
    point,
    iterations,
    observation,
  });

  for (;;) {
    const jacobian = evaluator.jacobianAt(point.parameters);
    if (!jacobian.finite) return end('derivative not finite', jacobian.observation);
    growScales(scales, jacobian.columns);
    if (iterations === 0) radius = FIRST_RADIUS * (scaledNorm(scales, point.parameters) || 1);
    const view = viewFrom(jacobian.columns, point, bounds);
    if (view.steepest === 0) return end('settled');

    for (let taken = false; !taken;) {
      const freeScales = Float64Array.from(view.free, (index) => at(scales, index));
      const damped = dampedStep(view.system, freeScales, radius, damping);
      damping = damped.damping;
      const trial = tryStep(evaluator, point, view, damped.step, damping, scales, bounds);
      if (iterations === 0) radius = Math.min(radius, trial.scaledLength);
      const ratio = trial.predicted > 0 ? trial.actual / trial.predicted : 0;
      ({ radius, damping } = adjustTrust(trial, ratio, radius, damping, point.length));

      taken = ratio >= WORTHWHILE;
      if (taken) {
        point = trial.point;
        iterations++;
      }
      const gained = Math.max(Math.abs(trial.actual), trial.predicted);
      if (gained <= TOLERANCE && ratio <= 2) return end('settled');
      if (radius <= TOLERANCE * scaledNorm(scales, point.parameters) || radius === 0) return end('settled');
      if (point.length === 0) return end('settled');
      if (evaluator.evaluations() >= maxEvaluations) return end('out of evaluations');
      if (!taken && view.steepest <= Number.EPSILON) return end('settled');
    }
  }
}

/** Moré's scales never shrink, so that a search cannot lose sight of a parameter that once mattered. */
function growScales(scales: Float64Array, columns: readonly Float64Array[]): void {
  columns.forEach((column, j) => (scales[j] = Math.max(at(scales, j), norm(column))));
  scales.forEach((scale, j) => {
    if (scale === 0) scales[j] = 1;
  });
}

function scaledNorm(scales: Float64Array, vector: Float64Array): number {
  return norm(vector.map((value, j) => value * at(scales, j)));
}

function viewFrom(columns: readonly Float64Array[], point: Point, bounds: Bounds): View {
  const gradient = gradientOf(columns, point.residuals);
  const pressed = pressedOnBound(point.parameters, gradient, bounds);
  const free = [...columns.keys()].filter((index) => !item(pressed, index));
  const qr = pivotedQr(free.map((index) => item(columns, index).slice()));
  const projected = project(qr, point.residuals);
  const steepest = free.reduce((most, index) => {
    const length = norm(item(columns, index));
    return length === 0 ? most : Math.max(most, Math.abs(at(gradient, index) / length / point.length));
  }, 0);
  return { system: { triangle: qr.triangle, order: qr.order, projected }, free, steepest };
}

function tryStep(
  evaluator: Evaluator,
  from: Point,
  { system, free }: View,
  freeStep: Float64Array,
  damping: number,
  scales: Float64Array,
  bounds: Bounds,
): Trial {
  const target = from.parameters.slice();
  free.forEach((index, j) => (target[index] = at(target, index) + at(freeStep, j)));
  const parameters = clampTo(target, bounds);
  const clamped = parameters.some((value, index) => value !== at(target, index));
  const step = clamped
    ? Float64Array.from(free, (index) => at(parameters, index) - at(from.parameters, index))
    : freeStep;
  const freeScales = Float64Array.from(free, (index) => at(scales, index));
  const scaledLength = scaledNorm(freeScales, step);
  const image = imageOf(system, step);
  const linear = (norm(image) / from.length) ** 2;
  const damped = damping * (scaledLength / from.length) ** 2;
  let slope = -(linear + damped);
  if (clamped)
    slope = image.reduce((sum, value, j) => sum + value * at(system.projected, j), 0) / from.length ** 2;
  const point = evaluator.pointAt(parameters);
  const actual = 0.1 * point.length < from.length ? 1 - (point.length / from.length) ** 2 : -1;
  return { point, scaledLength, actual, predicted: -2 * slope - linear, slope };
}

/** Shrinks the radius where the promise was not kept, widens it where it was; the damping moves the other way. */
function adjustTrust(
  trial: Trial,
  ratio: number,
  radius: number,
  damping: number,
  length: number,
): { radius: number; damping: number } {
  if (ratio > 0.25) {
    if (damping !== 0 && ratio < 0.75) return { radius, damping };
    return { radius: 2 * trial.scaledLength, damping: damping / 2 };
  }
  let factor = trial.actual >= 0 ? 0.5 : (0.5 * trial.slope) / (trial.slope + 0.5 * trial.actual);
  if (0.1 * trial.point.length >= length || !(factor >= 0.1 && factor <= 0.5)) factor = 0.1;
  return { radius: factor * Math.min(radius, 10 * trial.scaledLength), damping: damping / factor };
}
