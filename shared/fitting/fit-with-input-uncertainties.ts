import { at, item } from '#shared/numeric/element.ts';
import { fitLeastSquares } from './fit-least-squares.ts';
import type { FitOutcome } from './fit-outcome.ts';
import type { FitOptions, FitParameter } from './least-squares-problem.ts';

/** A curve y = f(x; p) through points whose inputs x may be uncertain too. */
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
  /** 'uncertainty not positive': some point has an effective uncertainty that is 0 or not finite, so it cannot be weighted. */
  readonly outcome: FitOutcome | UnweightablePoint;
  /** Effective standard uncertainty of each point, length n: √(u_y² + Σ (∂f/∂x · u_x)²). */
  readonly sigmas: Float64Array;
  /** Fits made, each with weights from the one before. */
  readonly rounds: number;
  /** True when a further round would not move the parameters. */
  readonly settled: boolean;
}

/** A point that cannot be weighted; nothing was fitted with it. */
export interface UnweightablePoint {
  readonly status: 'uncertainty not positive';
  readonly observation: number;
}

/** The weights change the parameters by second order only: more than ten rounds are rare. */
const MAX_ROUNDS = 50;

/** Parameters have settled when they move by less than this share of their standard error. */
const SETTLED = 1e-9;

/**
 * Least squares of a curve through points with uncertain inputs, by effective variances.
 *
 * Formula: σᵢ² = u_y² + Σ (∂f/∂x · u_x)² with the slope of the curve itself; fitted with these weights held, then
 * weighted anew, until nothing moves. The inputs' errors must be independent of one another and small beside the
 * curvature of f. Source: J. Orear, Am. J. Phys. 50, 912 (1982).
 *
 * @param problem - observations, uncertainties, model and derivatives
 * @param options - limits of each search
 * @returns the last fit; its χ² is that of the effective variances
 * @throws RangeError when lengths differ, a sigma is negative or not finite, or the fit's own demands are not met
 */
export function fitWithInputUncertainties(
  problem: InputUncertaintyProblem,
  options: FitOptions = {},
): InputUncertaintyFit {
  checkLengths(problem);
  let parameters = problem.parameters;
  let sigmas = effectiveSigmas(problem, startOf(parameters));
  for (let rounds = 1; ; rounds++) {
    const bad = sigmas.findIndex((sigma) => !(sigma > 0 && sigma < Infinity));
    if (bad >= 0) {
      const outcome = { status: 'uncertainty not positive', observation: bad } as const;
      return { outcome, sigmas, rounds: rounds - 1, settled: false };
    }
    const outcome = fitAtWeights(problem, parameters, sigmas, options);
    const slopesMatter = problem.inputSigmas.length > 0;
    if (outcome.status !== 'converged' && outcome.status !== 'not determined')
      return { outcome, sigmas, rounds, settled: !slopesMatter };
    const settled = !slopesMatter || hasSettled(outcome, startOf(parameters));
    if (settled || rounds === MAX_ROUNDS) return { outcome, sigmas, rounds, settled };
    parameters = parameters.map((parameter, j) => ({ ...parameter, start: at(outcome.parameters, j) }));
    sigmas = effectiveSigmas(problem, outcome.parameters);
  }
}

function checkLengths({ observed, outputSigmas, inputSigmas }: InputUncertaintyProblem): void {
  for (const sigmas of [outputSigmas, ...inputSigmas]) {
    if (sigmas.length !== observed.length)
      throw new RangeError(
        `fitWithInputUncertainties: needs ${observed.length} sigmas, got ${sigmas.length}`,
      );
    const bad = sigmas.find((sigma) => !(sigma >= 0 && sigma < Infinity));
    if (bad !== undefined)
      throw new RangeError(`fitWithInputUncertainties: needs sigmas that are finite and ≥ 0, got ${bad}`);
  }
}

function startOf(parameters: readonly FitParameter[]): Float64Array {
  return Float64Array.from(parameters, ({ start }) => start);
}

function effectiveSigmas(problem: InputUncertaintyProblem, p: Float64Array): Float64Array {
  const slopes = problem.inputSigmas.map((column) => new Float64Array(column.length));
  if (slopes.length > 0) problem.inputSlopes(p, slopes);
  return problem.outputSigmas.map((own, i) =>
    problem.inputSigmas.reduce((whole, sigmas, m) => {
      // A zero uncertainty stays zero even where the slope is infinite.
      return at(sigmas, i) === 0 ? whole : Math.hypot(whole, at(item(slopes, m), i) * at(sigmas, i));
    }, own),
  );
}

function fitAtWeights(
  problem: InputUncertaintyProblem,
  parameters: readonly FitParameter[],
  sigmas: Float64Array,
  options: FitOptions,
): FitOutcome {
  const { observed } = problem;
  return fitLeastSquares(
    {
      observations: observed.length,
      parameters,
      residuals(p, out) {
        problem.model(p, out);
        for (let i = 0; i < out.length; i++) out[i] = (at(out, i) - at(observed, i)) / at(sigmas, i);
      },
      jacobian(p, columns) {
        problem.jacobian(p, columns);
        for (const column of columns)
          for (let i = 0; i < column.length; i++) column[i] = at(column, i) / at(sigmas, i);
      },
    },
    options,
  );
}

function hasSettled(outcome: FitOutcome, before: Float64Array): boolean {
  if (outcome.status !== 'converged') return outcome.status === 'not determined';
  return outcome.parameters.every(
    (value, j) => Math.abs(value - at(before, j)) <= SETTLED * at(outcome.standardErrors, j),
  );
}
