/**
 * Deviance term x ln(x/m) + m − x, without cancellation where x is close to m.
 *
 * Method: with v = (x − m)/(x + m), x ln(x/m) = 2x artanh v as a series for |v| < 0.1; the plain formula elsewhere.
 * Source: C. Loader, Fast and Accurate Computation of Binomial Probabilities (2000), section 4 (bd0).
 *
 * @param x - number > 0
 * @param m - number > 0
 * @returns the term, ≥ 0
 * @example deviance(2, 2) // => 0
 */
export function deviance(x: number, m: number): number {
  const difference = x - m;
  if (Math.abs(difference) >= 0.1 * (x + m)) return x * Math.log(x / m) + m - x;
  const v = difference / (x + m);
  let total = difference * v;
  let power = 2 * x * v;
  for (let k = 1; ; k++) {
    power *= v * v;
    const next = total + power / (2 * k + 1);
    if (next === total) return total;
    total = next;
  }
}
