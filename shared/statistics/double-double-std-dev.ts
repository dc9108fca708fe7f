import { doubleDoubleSum } from '#shared/numeric/double-double-sum.ts';
import {
  divide,
  fromNumber,
  multiply,
  squareRoot,
  subtract,
  toNumber,
  type DoubleDouble,
} from '#shared/numeric/double-double.ts';

/**
 * Mean and experimental standard deviation of readings that carry their exact decimals.
 *
 * Formula: as `mean` and `sampleStdDev`, in arithmetic of about 32 digits.
 * Accuracy: 14 digits on the univariate NIST reference sets, NumAcc4 included.
 *
 * @param values - length n ≥ 1, all in one unit U
 * @returns the mean in U, and s in U or null when there are fewer than 2 values
 * @throws RangeError when there is no value
 * @example doubleDoubleStdDev([{ hi: 1, lo: 0 }, { hi: 3, lo: 0 }]).mean // => 2
 */
export function doubleDoubleStdDev(values: readonly DoubleDouble[]): {
  readonly mean: number;
  readonly stdDev: number | null;
} {
  const n = values.length;
  if (n === 0) throw new RangeError('doubleDoubleStdDev: needs at least 1 value, got 0');
  const centre = divide(doubleDoubleSum(values), fromNumber(n));
  if (n === 1) return { mean: toNumber(centre), stdDev: null };
  const squares = values.map((value) => {
    const deviation = subtract(value, centre);
    return multiply(deviation, deviation);
  });
  const variance = divide(doubleDoubleSum(squares), fromNumber(n - 1));
  return { mean: toNumber(centre), stdDev: toNumber(squareRoot(variance)) };
}
