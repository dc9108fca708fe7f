import type { FitOptions, LeastSquaresProblem } from './least-squares-problem.ts';
import type { FitOutcome } from './fit-outcome.ts';

/** Least squares of a problem with analytic derivatives and optional bounds. */
export function fitLeastSquares(_problem: LeastSquaresProblem, _options: FitOptions = {}): FitOutcome {
  throw new Error('fitLeastSquares: body follows');
}
