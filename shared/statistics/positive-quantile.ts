import type { Tails } from './incomplete-gamma.ts';

/** What the search needs to know of a distribution on the positive numbers. */
export interface PositiveDistribution {
  readonly tails: (x: number) => Tails;
  readonly logDensity: (x: number) => number;
}

/** Newton needs a handful of steps; plain halving of a bracket in ln x of width 1500 needs about 65. */
const MAX_STEPS = 300;

/** Largest moves of ln x in one step: outwards few at a time, inwards from a poor start more. */
const LARGEST_RISE = 3;
const LARGEST_FALL = 60;

/**
 * The x > 0 at which a distribution's tails are p and q.
 *
 * Method: Newton's iteration for ln P (or ln Q, the smaller of the two) as a function of ln x, inside a bracket that
 * shrinks with every step and is halved where Newton would leave it. ln P is nearly straight in the lower tail,
 * so that quantiles of tiny probabilities are found as quickly as the median.
 * Accuracy: that of the tails; relative 1e-12 in x where the tails have it.
 *
 * @param distribution - tails and density
 * @param p - lower tail wanted, 0 < p < 1
 * @param q - upper tail wanted, 1 − p without its rounding
 * @param start - any rough x > 0
 * @returns x
 * @example positiveQuantile({ tails: (x) => ({ lower: 1 - Math.exp(-x), upper: Math.exp(-x) }), logDensity: (x) => -x }, 0.5, 0.5, 1).toFixed(12) // => '0.693147180560'
 */
export function positiveQuantile(
  distribution: PositiveDistribution,
  p: number,
  q: number,
  start: number,
): number {
  const rising = p <= q;
  let logX = Math.log(start > 0 && Number.isFinite(start) ? start : 1);
  let low = -Infinity;
  let high = Infinity;
  for (let step = 0; step < MAX_STEPS; step++) {
    const x = Math.exp(logX);
    const tails = distribution.tails(x);
    const tail = rising ? tails.lower : tails.upper;
    // Positive where x is too large; an underflown tail is far too small.
    const excess = (rising ? 1 : -1) * (tail > 0 ? Math.log(tail / (rising ? p : q)) : -Infinity);
    if (excess === 0) return x;
    if (excess > 0) high = logX;
    else low = logX;
    const newton = logX - excess / Math.exp(distribution.logDensity(x) + logX - Math.log(tail));
    const next = insideBracket(newton, logX, low, high);
    if (Math.abs(next - logX) <= 1.5e-16 * Math.max(1, Math.abs(next))) return Math.exp(next);
    logX = next;
  }
  return Math.exp(logX);
}

/** Newton's point where it may be trusted, else the middle of the bracket, else a stride towards its open end. */
function insideBracket(newton: number, current: number, low: number, high: number): number {
  if (newton > low && newton < high) {
    const bounded = Math.max(current - LARGEST_FALL, Math.min(current + LARGEST_RISE, newton));
    if (bounded > low && bounded < high) return bounded;
  }
  if (Number.isFinite(low) && Number.isFinite(high)) return (low + high) / 2;
  const stride = Math.min(20, Math.max(1, Math.abs(current) / 2));
  return high === Infinity ? current + stride : current - stride;
}
