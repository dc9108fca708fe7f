import type { FitOutcome } from '#shared/fitting/fit-outcome.ts';
import { fitLeastSquares } from '#shared/fitting/fit-least-squares.ts';
import type { FitOptions, FitParameter } from '#shared/fitting/least-squares-problem.ts';
import { at, item } from '#shared/numeric/element.ts';

/** A curve with its derivatives by the parameters, for the tests of fitting. */
export interface Curve {
  readonly value: (p: Float64Array, x: number) => number;
  readonly derivatives: readonly ((p: Float64Array, x: number) => number)[];
}

/** p0 + p1 x. */
export const line: Curve = {
  value: (p, x) => at(p, 0) + at(p, 1) * x,
  derivatives: [() => 1, (_p, x) => x],
};

/** p0 exp(−p1 x). */
export const decay: Curve = {
  value: (p, x) => at(p, 0) * Math.exp(-at(p, 1) * x),
  derivatives: [(p, x) => Math.exp(-at(p, 1) * x), (p, x) => -x * at(p, 0) * Math.exp(-at(p, 1) * x)],
};

/** Points a curve is set against; sigma 1 each unless given. */
export interface Points {
  readonly x: readonly number[];
  readonly y: readonly number[];
  readonly sigmas?: readonly number[];
}

/** Fits a curve to points. */
export function fitCurve(
  curve: Curve,
  { x, y, sigmas }: Points,
  parameters: readonly FitParameter[],
  options: FitOptions = {},
): FitOutcome {
  const sigma = (i: number): number => (sigmas === undefined ? 1 : item(sigmas, i));
  return fitLeastSquares(
    {
      observations: x.length,
      parameters,
      residuals: (p, out) => out.set(x.map((value, i) => (curve.value(p, value) - item(y, i)) / sigma(i))),
      jacobian: (p, columns) =>
        columns.forEach((column, j) =>
          column.set(x.map((value, i) => item(curve.derivatives, j)(p, value) / sigma(i))),
        ),
    },
    options,
  );
}

/** The fit, which must have converged. */
export function convergedFit(outcome: FitOutcome): Extract<FitOutcome, { status: 'converged' }> {
  if (outcome.status !== 'converged') throw new Error(`fit ended as ${outcome.status}`);
  return outcome;
}
