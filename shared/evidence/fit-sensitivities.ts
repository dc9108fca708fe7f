import { at, item } from '#shared/numeric/element.ts';
import type { ConvergedFit } from '#shared/fitting/fit-outcome.ts';
import type { ComparisonData } from './comparison-data.ts';
import {
  columnOfSource,
  ownSources,
  parameterSource,
  residualSlope,
  sharedSources,
  type ComparisonModel,
  type SourceMove,
} from './comparison-model.ts';
import { rowOf } from './uncertain.ts';

/** What a solved fit hands over. */
export interface FitSolution {
  readonly data: ComparisonData;
  readonly model: ComparisonModel;
  readonly outcome: ConvergedFit;
  readonly outputSigmas: Float64Array;
}

/** How every parameter moves when a shared source moves by its standard uncertainty. */
export interface SourceSensitivity {
  readonly source: string;
  /** Length k. */
  readonly byParameter: Float64Array;
}

/** Step of the differences below in standard uncertainties: their error is about its square, rounding 1e-16 over it. */
const STEP = 1e-3;

/**
 * Exact sensitivities of a fit's parameters to the sources shared by its trials, by implicit differentiation of
 * the condition that the fit fulfils, the weights' own dependence included.
 *
 * Formula: F(p, s) = Σᵢ (∂fᵢ/∂p)(yᵢ − fᵢ)/Vᵢ = 0, so dp/ds = −(∂F/∂p)⁻¹ ∂F/∂s. F has analytic derivatives inside;
 * its own derivatives are central differences in steps of a thousandth of each uncertainty.
 * Parameters on a bound stay there.
 */
export function fitSensitivities(solution: FitSolution): readonly SourceSensitivity[] {
  const sources = sharedSources(solution.data);
  const { parameters, atBound, covariance } = solution.outcome;
  const k = parameters.length;
  const moving = [...parameters.keys()].filter((i) => atBound[i] !== true);
  if (sources.length === 0) return [];
  const byParameter = moving.map((j) => {
    const step = STEP * Math.sqrt(at(covariance, j * k + j));
    const moved = (by: number): Float64Array => parameters.map((value, i) => (i === j ? value + by : value));
    return difference(stationarity(solution, moved(step)), stationarity(solution, moved(-step)), step);
  });
  return sources.map((source) => {
    const shift = (by: number): Float64Array => stationarity(solution, parameters, { source, by });
    const bySource = difference(shift(STEP), shift(-STEP), STEP);
    const matrix = moving.map((row) => byParameter.map((column) => at(column, row)));
    const right = moving.map((row) => -at(bySource, row));
    const solved = solveSquare(matrix, right);
    const result = new Float64Array(k);
    moving.forEach((parameter, i) => {
      result[parameter] = item(solved, i);
    });
    return { source, byParameter: result };
  });
}

function difference(up: Float64Array, down: Float64Array, step: number): Float64Array {
  return up.map((value, i) => (value - at(down, i)) / (2 * step));
}

/** F at some parameters and some state of the sources. */
function stationarity(
  { data, model, outputSigmas }: FitSolution,
  parameters: Float64Array,
  move?: SourceMove,
): Float64Array {
  const { rows } = model;
  const predicted = model.predict(parameters, 'parameters and own errors', move);
  const measured = model.measured(move);
  const variances = outputSigmas.map((u) => u * u);
  for (const { source, kind } of ownSources(data)) {
    const slope = residualSlope(data, predicted.terms, source, kind, rows);
    for (let row = 0; row < rows; row++) variances[row] = at(variances, row) + at(slope, row) ** 2;
  }
  return Float64Array.from(parameters, (_, j) => {
    const column = columnOfSource(predicted, parameterSource(j), 'shared', rows);
    let sum = 0;
    for (let row = 0; row < rows; row++)
      sum += (at(column, row) * (at(measured, row) - rowOf(predicted.values, row))) / at(variances, row);
    return sum;
  });
}

/** Solves a small square system by elimination with row pivoting; NaN where it is singular. */
function solveSquare(matrix: readonly (readonly number[])[], right: readonly number[]): number[] {
  const rows = matrix.map((row, i) => [...row, item(right, i)]);
  const n = rows.length;
  for (let column = 0; column < n; column++) {
    const pivot = rows
      .slice(column)
      .reduce(
        (best, row, i) =>
          Math.abs(item(row, column)) > Math.abs(item(item(rows, best), column)) ? column + i : best,
        column,
      );
    const [low, high] = [item(rows, column), item(rows, pivot)];
    rows[pivot] = low;
    rows[column] = high;
    for (let row = column + 1; row < n; row++) {
      const factor = item(item(rows, row), column) / item(high, column);
      rows[row] = item(rows, row).map((value, i) => value - factor * item(high, i));
    }
  }
  const solution = new Array<number>(n).fill(0);
  for (let row = n - 1; row >= 0; row--) {
    let rest = item(item(rows, row), n);
    for (let column = row + 1; column < n; column++)
      rest -= item(item(rows, row), column) * item(solution, column);
    solution[row] = rest / item(item(rows, row), row);
  }
  return solution;
}
