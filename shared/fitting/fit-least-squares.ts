import { boundsOf, gradientOf, pressedOnBound, type Bounds } from './bounds.ts';
import { concludeFit } from './conclude-fit.ts';
import { createEvaluator, firstNotFinite, type Evaluator, type Point } from './evaluator.ts';
import type { FitOutcome } from './fit-outcome.ts';
import { gaussNewtonPolish } from './gauss-newton-polish.ts';
import { checkProblem, type FitOptions, type LeastSquaresProblem } from './least-squares-problem.ts';
import { levenbergMarquardt } from './levenberg-marquardt.ts';
import { solveIfLinear } from './solve-if-linear.ts';

/**
 * Least squares of a problem with derivatives and optional bounds.
 *
 * Method: a problem that turns out linear in its parameters is solved by QR at once. Others go through a
 * Levenberg-Marquardt search and a Gauss-Newton polish; the covariance comes from a QR factorisation with scaled
 * columns, never from the normal matrix. The minimum found is one near the start: it need not be the only one.
 * Source: J. J. Moré, Lecture Notes in Mathematics 630, 105 (1978).
 * Accuracy: NIST reference sets from both of their starts, parameters to 9 digits and more, standard errors to 8.
 *
 * @param problem - residuals, their derivatives and the free parameters
 * @param options - limits of the search
 * @returns how the fit ended: a union on `status`; only 'converged' carries a covariance
 * @throws RangeError when there is no observation or parameter, or a start, bound or option is not usable
 * @example fitLeastSquares({ observations: 2, parameters: [{ start: 0 }], residuals: (p, out) => out.set([p[0] - 1, p[0] - 3]), jacobian: (p, columns) => columns[0].fill(1) }).parameters[0].toFixed(12) // => '2.000000000000'
 */
export function fitLeastSquares(problem: LeastSquaresProblem, options: FitOptions = {}): FitOutcome {
  const { maxEvaluations } = checkProblem(problem, options);
  const needed = problem.parameters.length;
  if (problem.observations < needed)
    return { status: 'too few observations', observations: problem.observations, needed };

  const evaluator = createEvaluator(problem);
  const bounds = boundsOf(problem.parameters);
  const start = evaluator.pointAt(Float64Array.from(problem.parameters, (parameter) => parameter.start));
  const unusable = findUnusableStart(evaluator, start);
  if (unusable !== null) return unusable;

  const exact = solveIfLinear(evaluator, start, bounds);
  if (exact !== null) return concludeFit(evaluator, exact, bounds, 1, true);

  const search = levenbergMarquardt(evaluator, start, bounds, maxEvaluations);
  if (search.reason === 'derivative not finite')
    return {
      status: 'not finite',
      where: 'search',
      what: 'derivative',
      observation: search.observation,
      parameters: search.point.parameters,
    };
  const polished = gaussNewtonPolish(
    evaluator,
    search.point,
    freeAt(evaluator, search.point, bounds),
    bounds,
  );
  return concludeFit(evaluator, polished.point, bounds, search.iterations + polished.steps, false);
}

function findUnusableStart(
  evaluator: Evaluator,
  { parameters, residuals, length }: Point,
): FitOutcome | null {
  const fault = { status: 'not finite', where: 'start', parameters } as const;
  if (!Number.isFinite(length))
    return { ...fault, what: 'residual', observation: Math.max(0, firstNotFinite(residuals)) };
  const jacobian = evaluator.jacobianAt(parameters);
  return jacobian.finite ? null : { ...fault, what: 'derivative', observation: jacobian.observation };
}

/** Parameters that are not held on a bound at a point. */
function freeAt(evaluator: Evaluator, point: Point, bounds: Bounds): number[] {
  const jacobian = evaluator.jacobianAt(point.parameters);
  if (!jacobian.finite) return [];
  const pressed = pressedOnBound(point.parameters, gradientOf(jacobian.columns, point.residuals), bounds);
  return [...pressed.keys()].filter((index) => pressed[index] === false);
}
