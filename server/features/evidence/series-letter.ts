/** Letters of series in order: A to Z, then AA to ZZ. */
const FIRST = 'A'.charCodeAt(0);

export const MAX_SERIES = 26 + 26 * 26;

/** Letter of the nth series of a problem, 1 ≤ position ≤ MAX_SERIES. */
export function letterAt(position: number): string {
  const index = position - 1;
  if (index < 26) return String.fromCharCode(FIRST + index);
  const rest = index - 26;
  return String.fromCharCode(FIRST + Math.floor(rest / 26), FIRST + (rest % 26));
}

/** The inverse of letterAt. */
export function positionOfLetter(letter: string): number {
  const [first = FIRST, second] = [...letter].map((sign) => sign.charCodeAt(0));
  if (second === undefined) return first - FIRST + 1;
  return 26 + (first - FIRST) * 26 + (second - FIRST) + 1;
}
