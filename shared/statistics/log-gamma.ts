import { stirlingError } from './stirling-error.ts';

/** ln √(2π). */
const LN_SQRT_TWO_PI = 0.9189385332046728;

/**
 * Natural logarithm of the gamma function.
 *
 * Formula: ln Γ(z) = (z − ½) ln z − z + ln √(2π) + δ(z), δ the error of Stirling's formula.
 * Source: NIST Digital Library of Mathematical Functions, 5.11.1.
 * Accuracy: error below 5e-15 · max(1, |ln Γ(z)|) against 30-digit values in tests/fixtures/distributions; near
 * z = 1 and z = 2, where the value is 0, the digits are absolute.
 *
 * @param z - number > 0
 * @returns ln Γ(z); Infinity at 0 and at Infinity, NaN below 0
 * @example logGamma(5).toFixed(12) // => '3.178053830348'
 */
export function logGamma(z: number): number {
  if (z === 0 || z === Infinity) return Infinity;
  if (!(z > 0)) return NaN;
  return (z - 0.5) * Math.log(z) - z + LN_SQRT_TWO_PI + stirlingError(z);
}
