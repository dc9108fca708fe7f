import { mean } from '#shared/statistics/mean.ts';
import { sampleStdDev } from '#shared/statistics/sample-std-dev.ts';

/** Mean of repeats and what their scatter says about it (Type A). */
export interface MeanOfRepeats {
  readonly mean: number;
  /** Sample standard deviation s, n − 1; null for a single reading. */
  readonly scatter: number | null;
  /** s/√n; null for a single reading. */
  readonly standardUncertainty: number | null;
  /** n − 1. */
  readonly degreesOfFreedom: number;
}

/**
 * Mean of repeated readings with the standard uncertainty that their scatter gives.
 *
 * Formula: u = s/√n with ν = n − 1. Source: JCGM 100:2008, 4.2.1 to 4.2.3.
 *
 * @param readings - length n ≥ 1, in any one unit
 * @throws RangeError when there is no reading
 * @example meanOfRepeats([1, 3]).standardUncertainty // => 1
 */
export function meanOfRepeats(readings: readonly number[]): MeanOfRepeats {
  const n = readings.length;
  if (n === 0) throw new RangeError('meanOfRepeats: needs at least one reading, got none');
  const scatter = n > 1 ? sampleStdDev(readings) : null;
  return {
    mean: mean(readings),
    scatter,
    standardUncertainty: scatter === null ? null : scatter / Math.sqrt(n),
    degreesOfFreedom: n - 1,
  };
}
