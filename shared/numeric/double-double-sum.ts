import { ZERO, add, type DoubleDouble } from './double-double.ts';

/**
 * Sum of double-doubles, in double-double.
 *
 * @param values - length n ≥ 0, all in one unit U
 * @returns their sum in U; zero for none
 * @example doubleDoubleSum([{ hi: 1, lo: 1e-20 }, { hi: -1, lo: 0 }]).hi // => 1e-20
 */
export function doubleDoubleSum(values: Iterable<DoubleDouble>): DoubleDouble {
  let total = ZERO;
  for (const value of values) total = add(total, value);
  return total;
}
