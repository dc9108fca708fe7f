import { at } from '#shared/numeric/element.ts';
import type { FitParameter } from './least-squares-problem.ts';

/** Box that holds the parameters; open sides are infinite. */
export interface Bounds {
  readonly min: Float64Array;
  readonly max: Float64Array;
}

/**
 * Bounds of parameters as columns.
 *
 * @param parameters - length k
 */
export function boundsOf(parameters: readonly FitParameter[]): Bounds {
  return {
    min: Float64Array.from(parameters, ({ min }) => min ?? -Infinity),
    max: Float64Array.from(parameters, ({ max }) => max ?? Infinity),
  };
}

/**
 * The nearest place inside the box.
 *
 * @param parameters - length k
 * @param bounds - box
 */
export function clampTo(parameters: Float64Array, { min, max }: Bounds): Float64Array {
  return parameters.map((value, j) => Math.min(Math.max(value, at(min, j)), at(max, j)));
}

/**
 * Which parameters stand on a bound and would go beyond it to make χ² smaller.
 *
 * @param parameters - length k
 * @param gradient - Jᵀr, length k: χ² falls against its sign
 * @param bounds - box
 */
export function pressedOnBound(
  parameters: Float64Array,
  gradient: Float64Array,
  { min, max }: Bounds,
): boolean[] {
  return Array.from(parameters, (value, j) => {
    const slope = at(gradient, j);
    return (value <= at(min, j) && slope > 0) || (value >= at(max, j) && slope < 0);
  });
}

/**
 * Jᵀr.
 *
 * @param columns - J, k columns of length n
 * @param residuals - r, length n
 */
export function gradientOf(columns: readonly Float64Array[], residuals: Float64Array): Float64Array {
  return Float64Array.from(columns, (column) => {
    let total = 0;
    for (let i = 0; i < column.length; i++) total += at(column, i) * at(residuals, i);
    return total;
  });
}
