import { studentTails } from './student-tails.ts';

/**
 * Upper tail of Student's distribution, P(T > t).
 *
 * Accuracy: relative 1e-12 down to 1e-300, against 20-digit values in tests/fixtures/distributions.
 *
 * @param t - value
 * @param degreesOfFreedom - > 0, not necessarily whole; Infinity gives the normal distribution
 * @returns the probability; NaN outside the domain
 * @example studentUpperTail(0, 4) // => 0.5
 */
export function studentUpperTail(t: number, degreesOfFreedom: number): number {
  const { lower, upper } = studentTails(t, degreesOfFreedom);
  return t >= 0 ? 0.5 * upper : 0.5 + 0.5 * lower;
}
