import { normalUpperTail } from './normal-upper-tail.ts';

/** How often the sign of the residuals changes, beside what chance would do. */
export interface RunsTest {
  readonly runs: number;
  readonly above: number;
  readonly below: number;
  /** Mean number of runs if the order is random. */
  readonly expected: number;
  /** (runs − expected) / standard deviation, without continuity correction: negative means long runs, a trend. */
  readonly z: number;
  /** Two-sided, from the exact distribution of the number of runs. */
  readonly pValue: number;
}

/** Up to this many signs the exact distribution is summed; above, the normal limit is as good. */
const EXACT_UP_TO = 200;

/**
 * Runs test of randomness: do residuals of one sign follow one another more often than by chance?
 *
 * Formula: with n₊ and n₋ signs, mean 2n₊n₋/n + 1, variance 2n₊n₋(2n₊n₋ − n)/(n²(n − 1)); zeros are left out. The
 * p-value doubles the smaller exact tail. Source: A. Wald, J. Wolfowitz, Ann. Math. Stat. 11, 147 (1940).
 *
 * @param residuals - in the order to be tested (by setting, or by time)
 * @returns the test, or null when there are not at least two residuals of each sign
 * @example runsTest([1, 2, -1, -2, 1, 2, -1, -2]).runs // => 4
 */
export function runsTest(residuals: ArrayLike<number>): RunsTest | null {
  const signs = Array.from(residuals, Math.sign).filter((sign) => sign !== 0);
  const above = signs.filter((sign) => sign > 0).length;
  const below = signs.length - above;
  if (above < 2 || below < 2) return null;
  const runs = signs.filter((sign, i) => i === 0 || sign !== signs[i - 1]).length;
  const n = above + below;
  const pairs = 2 * above * below;
  const expected = pairs / n + 1;
  const z = (runs - expected) / Math.sqrt((pairs * (pairs - n)) / (n * n * (n - 1)));
  const pValue = n <= EXACT_UP_TO ? exactPValue(runs, above, below) : 2 * normalUpperTail(Math.abs(z));
  return { runs, above, below, expected, z, pValue: Math.min(1, pValue) };
}

function exactPValue(runs: number, above: number, below: number): number {
  let atMost = 0;
  let atLeast = 0;
  for (let count = 2; count <= above + below; count++) {
    const probability = probabilityOfRuns(count, above, below);
    if (count <= runs) atMost += probability;
    if (count >= runs) atLeast += probability;
  }
  return 2 * Math.min(atMost, atLeast);
}

/** Ways to cut both signs into the parts of `count` alternating runs, over all orders of the signs. */
function probabilityOfRuns(count: number, above: number, below: number): number {
  const half = Math.floor(count / 2);
  const ways =
    count % 2 === 0
      ? 2 * choose(above - 1, half - 1) * choose(below - 1, half - 1)
      : choose(above - 1, half) * choose(below - 1, half - 1) +
        choose(above - 1, half - 1) * choose(below - 1, half);
  return ways / choose(above + below, above);
}

function choose(n: number, k: number): number {
  let product = 1;
  if (k < 0 || k > n) return 0;
  for (let i = 1; i <= k; i++) product *= (n - k + i) / i;
  return product;
}
