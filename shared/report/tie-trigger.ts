/** What a writer has begun: the symbol before a plus-minus, and where it stands. */
export interface TieTrigger {
  /** The symbol as it was typed: "R", "theta", "C_v". */
  readonly symbol: string;
  /** Where the symbol begins in the given text. */
  readonly from: number;
  /** What was typed after the plus-minus, to narrow the list. */
  readonly narrowing: string;
}

const TRIGGER =
  /(?<![\p{L}\p{N}_\\])(\p{L}+(?:_(?:\{[\p{L}\p{N},]+\}|[\p{L}\p{N}]+))?) ?(?:\+-|\+\/-|±) ?([\p{L}\p{N} .°]{0,24})$/u;

/**
 * Finds a symbol followed by `+-` or `±` at the end of a text. After a plain number, a plus-minus is only that.
 *
 * @param text - what stands before the caret in its paragraph
 * @example findTieTrigger('At 45° we find R +-') // => { symbol: 'R', from: 15, narrowing: '' }
 * @example findTieTrigger('it is 44.8 ±') // => null
 * @example findTieTrigger('R ± mean') // => { symbol: 'R', from: 0, narrowing: 'mean' }
 */
export function findTieTrigger(text: string): TieTrigger | null {
  const match = TRIGGER.exec(text);
  if (match === null) return null;
  const [, symbol = '', narrowing = ''] = match;
  return { symbol, from: match.index, narrowing: narrowing.trimStart() };
}
