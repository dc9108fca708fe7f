import type { FitOptions, FitParameter } from './least-squares-problem.ts';
import type { FitOutcome } from './fit-outcome.ts';

/** A curve y = f(x; p) through points whose inputs x are uncertain too. */
export interface InputUncertaintyProblem {
  /** Measured outputs yᵢ, length n. */
  readonly observed: Float64Array;
  /** Standard uncertainties of the outputs, length n, each ≥ 0. */
  readonly outputSigmas: Float64Array;
  /** For each uncertain input, its standard uncertainties, length n each, ≥ 0. May be empty. */
  readonly inputSigmas: readonly Float64Array[];
  readonly parameters: readonly FitParameter[];
  /** Writes f(xᵢ; p) into `out`, length n. */
  readonly model: (p: Float64Array, out: Float64Array) => void;
  /** Writes ∂f/∂pⱼ into `columns[j]`, length n each. */
  readonly jacobian: (p: Float64Array, columns: readonly Float64Array[]) => void;
  /** Writes ∂f/∂x at each point into `columns[m]`, one column for each entry of `inputSigmas`. */
  readonly inputSlopes: (p: Float64Array, columns: readonly Float64Array[]) => void;
}

/** How a fit with uncertain inputs ended: the fit at the last weights, and those weights. */
export interface InputUncertaintyFit {
  readonly outcome: FitOutcome;
  /** Effective standard uncertainty of each point, length n: √(u_y² + Σ (∂f/∂x · u_x)²). */
  readonly sigmas: Float64Array;
  /** Times the weights were computed anew. */
  readonly rounds: number;
  /** True when a further round would not have moved the parameters. */
  readonly settled: boolean;
}

/** Least squares by effective variances, iterated until the weights settle. */
export function fitWithInputUncertainties(
  _problem: InputUncertaintyProblem,
  _options: FitOptions = {},
): InputUncertaintyFit {
  throw new Error('fitWithInputUncertainties: body follows');
}
