import { studentQuantile } from './student-quantile.ts';

/**
 * Coverage factor k for a level of confidence: ±k·u holds the value with that probability.
 *
 * Formula: the (1 + level)/2 quantile of Student's distribution. Source: JCGM 100:2008, G.3.2 and table G.2.
 *
 * @param level - 0 < level < 1, e.g. 0.95
 * @param degreesOfFreedom - effective degrees of freedom > 0; Infinity gives the normal factor
 * @returns k
 * @throws RangeError when an argument lies outside its domain
 * @example coverageFactor(0.95, Infinity).toFixed(9) // => '1.959963985'
 */
export function coverageFactor(level: number, degreesOfFreedom: number): number {
  if (!(level > 0 && level < 1))
    throw new RangeError(`coverageFactor: needs a level between 0 and 1, got ${level}`);
  if (!(degreesOfFreedom > 0))
    throw new RangeError(`coverageFactor: needs degrees of freedom > 0, got ${degreesOfFreedom}`);
  return -studentQuantile((1 - level) / 2, degreesOfFreedom);
}
