/** Stands for a denominator that has come out as zero. */
const TINY = 1e-300;

/** Relative change of a step at which the fraction has settled: two units in the last place. */
const SETTLED = 4.5e-16;

/** Enough for arguments of 1e8: the fractions here need about the square root of the argument. */
const MAX_STEPS = 100_000;

/**
 * Value of the continued fraction b₀ + a₁/(b₁ + a₂/(b₂ + …)).
 *
 * Method: modified Lentz. Source: W. J. Lentz, Applied Optics 15, 668 (1976), with the zero guard of
 * I. J. Thompson, A. R. Barnett, J. Comput. Phys. 64, 490 (1986).
 *
 * @param first - b₀
 * @param term - gives the pair [aₖ, bₖ] for k = 1, 2, …
 * @returns the value; NaN when it has not settled after 100 000 steps
 * @example continuedFraction(1, () => [1, 1]).toFixed(9) // => '1.618033989'
 */
export function continuedFraction(
  first: number,
  term: (k: number) => readonly [numerator: number, denominator: number],
): number {
  let value = first === 0 ? TINY : first;
  let upper = value;
  let lower = 0;
  for (let k = 1; k <= MAX_STEPS; k++) {
    const [numerator, denominator] = term(k);
    lower = denominator + numerator * lower;
    upper = denominator + numerator / upper;
    lower = 1 / (lower === 0 ? TINY : lower);
    upper = upper === 0 ? TINY : upper;
    const change = upper * lower;
    value *= change;
    if (Math.abs(change - 1) <= SETTLED) return value;
  }
  return NaN;
}
