import type { Contribution } from './contribution.ts';
import { covariance } from './covariance.ts';
import { standardUncertainty } from './standard-uncertainty.ts';

/**
 * Correlation coefficient of two values: their covariance over the product of their standard uncertainties.
 *
 * @returns −1 to 1; NaN when either value is without uncertainty
 * @example correlation([{ source: 'rule', c: 2 }], [{ source: 'rule', c: 3 }]) // => 1
 */
export function correlation(a: readonly Contribution[], b: readonly Contribution[]): number {
  return covariance(a, b) / (standardUncertainty(a) * standardUncertainty(b));
}
