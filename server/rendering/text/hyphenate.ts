import createHyphenator from 'hyphen';
import patterns from 'hyphen/patterns/en-gb.js';

const SOFT_HYPHEN = '\u00ad';
const LEAST_LENGTH = 7;
const PLAIN_WORD = /^[A-Za-z]+[,.;:)]*$/u;

const hyphenator = createHyphenator(patterns, { hyphenChar: SOFT_HYPHEN, minWordLength: LEAST_LENGTH });
const cache = new Map<string, readonly string[]>();

/** The pieces of a word between which a line may end with a hyphen; symbols and figures stay whole. */
export function hyphenate(word: string): readonly string[] {
  if (!PLAIN_WORD.test(word)) return [word];
  const known = cache.get(word);
  if (known) return known;
  const pieces = String(hyphenator(word)).split(SOFT_HYPHEN);
  cache.set(word, pieces);
  return pieces;
}
