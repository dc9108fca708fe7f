import type { Contribution } from './contribution.ts';

/**
 * Covariance of two values that were made from the same independent sources.
 *
 * Formula: u(x, y) = Σ cₛ(x) cₛ(y) over the sources in common.
 * Source: JCGM 100:2008, F.1.2.3, equation F.2.
 *
 * @param a - contributions of x, each source once
 * @param b - contributions of y, each source once
 * @returns covariance, in the product of the two units; 0 without a common source
 * @example covariance([{ source: 'rule', c: 2 }], [{ source: 'rule', c: -3 }]) // => -6
 */
export function covariance(a: readonly Contribution[], b: readonly Contribution[]): number {
  const ofSource = new Map(a.map(({ source, c }) => [source, c]));
  let sum = 0;
  for (const { source, c } of b) sum += (ofSource.get(source) ?? 0) * c;
  return sum;
}
