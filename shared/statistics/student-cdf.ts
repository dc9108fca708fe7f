import { studentUpperTail } from './student-upper-tail.ts';

/**
 * Cumulative distribution function of Student's distribution, P(T ≤ t).
 *
 * Accuracy: relative 1e-12 down to 1e-300, against 20-digit values in tests/fixtures/distributions.
 *
 * @param t - value
 * @param degreesOfFreedom - > 0, not necessarily whole; Infinity gives the normal distribution
 * @returns the probability; NaN outside the domain
 * @example studentCdf(0, 4) // => 0.5
 */
export function studentCdf(t: number, degreesOfFreedom: number): number {
  return studentUpperTail(-t, degreesOfFreedom);
}
