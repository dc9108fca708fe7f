import { norm } from '#shared/numeric/norm.ts';
import type { Contribution } from './contribution.ts';

/**
 * Standard uncertainty (k = 1) of a value: the square root of the sum of its squared contributions.
 *
 * @param contributions - one for each independent source; none gives 0
 * @returns u ≥ 0 in the value's unit
 * @example standardUncertainty([{ source: 'rule', c: -3 }, { source: 'scatter', c: 4 }]) // => 5
 */
export function standardUncertainty(contributions: readonly Contribution[]): number {
  return norm(Float64Array.from(contributions, ({ c }) => c));
}
