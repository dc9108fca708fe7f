import { studentQuantile } from '#shared/statistics/student-quantile.ts';

/** Half-width of a coverage interval, and its factor. */
export interface ExpandedUncertainty {
  readonly expanded: number;
  readonly k: number;
}

/**
 * Expanded uncertainty U = k·u at a level of confidence, with k from Student's t.
 *
 * Effective degrees of freedom are cut to the integer below, as the GUM does for its table.
 * Source: JCGM 100:2008, 6.2.1 and G.4.1, G.6.4.
 *
 * @param standard - combined standard uncertainty (k = 1), ≥ 0, in any one unit
 * @param degreesOfFreedom - effective degrees of freedom, ≥ 1 or Infinity
 * @param level - level of confidence, 0 < level < 1
 * @throws RangeError when the level or the degrees of freedom lie outside
 */
export function expandedUncertainty(
  standard: number,
  degreesOfFreedom: number,
  level: number,
): ExpandedUncertainty {
  if (!(level > 0 && level < 1))
    throw new RangeError(`expandedUncertainty: needs a level between 0 and 1, got ${level}`);
  if (!(degreesOfFreedom >= 1))
    throw new RangeError(`expandedUncertainty: needs at least 1 degree of freedom, got ${degreesOfFreedom}`);
  const k = studentQuantile((1 + level) / 2, Math.floor(degreesOfFreedom));
  return { expanded: k * standard, k };
}
