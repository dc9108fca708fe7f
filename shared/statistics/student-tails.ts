import { incompleteBeta } from './incomplete-beta.ts';
import { incompleteGamma, type Tails } from './incomplete-gamma.ts';
import { logGamma } from './log-gamma.ts';

/** Above this t² the ratio ν/(ν + t²) may leave the range of doubles; the leading term is exact there. */
const FAR = 1e290;

/**
 * Both parts of the distribution of |T|: P(|T| ≤ t) and P(|T| > t).
 *
 * Formula: P(|T| > t) = I_y(ν/2, ½) with y = ν/(ν + t²); the normal distribution for ν = Infinity.
 * Source: NIST Digital Library of Mathematical Functions, 8.17; M. Abramowitz, I. A. Stegun, 26.7.1.
 *
 * @param t - value; its sign does not matter
 * @param degreesOfFreedom - ν > 0, not necessarily whole; Infinity allowed
 * @returns both probabilities; NaN outside the domain
 * @example studentTails(0, 5).upper // => 1
 */
export function studentTails(t: number, degreesOfFreedom: number): Tails {
  const square = t * t;
  if (degreesOfFreedom === Infinity) return incompleteGamma(0.5, square / 2);
  if (!(degreesOfFreedom > 0) || Number.isNaN(t)) return { lower: NaN, upper: NaN };
  if (square > FAR) return farTails(Math.abs(t), degreesOfFreedom);
  const whole = degreesOfFreedom + square;
  return incompleteBeta(0.5, degreesOfFreedom / 2, square / whole, degreesOfFreedom / whole);
}

/** Leading term y^(ν/2) / (B(½, ν/2) · ν/2) with ln y = ln ν − 2 ln |t|; the next one is smaller by y. */
function farTails(t: number, nu: number): Tails {
  const logBeta = logGamma(0.5) + logGamma(nu / 2) - logGamma((nu + 1) / 2);
  const logPower = (nu / 2) * (Math.log(nu) - 2 * Math.log(t));
  const upper = Math.min(1, Math.exp(logPower - logBeta) / (nu / 2));
  return { lower: 1 - upper, upper };
}
