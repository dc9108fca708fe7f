/**
 * Sum of numbers with a running correction for what each addition rounds away.
 *
 * Method: the larger of the running sum and the new term gives back exactly what the addition lost; the losses
 * are added once at the end. Source: A. Neumaier, Z. angew. Math. Mech. 54, 39 (1974).
 * Accuracy: error below 2 ulp of the sum + n² · 1e-32 · Σ|xᵢ|. A sum that holds an infinity or NaN follows IEEE.
 *
 * @param values - length n ≥ 0, all in one unit U
 * @returns their sum in U; 0 for none
 * @example sum([1, 1e100, 1, -1e100]) // => 2
 */
export function sum(values: Iterable<number>): number {
  let total = 0;
  let lost = 0;
  for (const value of values) {
    const next = total + value;
    lost += Math.abs(total) >= Math.abs(value) ? total - next + value : value - next + total;
    total = next;
  }
  return Number.isFinite(lost) ? total + lost : total;
}
