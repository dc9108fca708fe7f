/** Finding the words of a note again by what they say and what stood around them, and refusing whatever is doubtful. */
import { CONTEXT_LENGTH } from './note-anchor.ts';

/** Words with what stood around them. */
export interface QuoteInContext {
  readonly quote: string;
  readonly before: string;
  readonly after: string;
}

/** Places in a text: from inclusive, to exclusive. */
export interface Span {
  readonly from: number;
  readonly to: number;
}

/** Stand for the two ends of a section, so that "at the very beginning" is context too. */
const START = '\u0002';
const END = '\u0003';

/** Below this share of the context, the same words are other words. */
const LEAST_CONTEXT = 0.75;
/** A second place whose context agrees nearly as well makes the words ambiguous. */
const CLEAR_BY = 0.25;
/** Words count as still there while this share of them is. */
const LEAST_KEPT = 0.5;
/** Nobody writes this much into the middle of a quoted sentence. */
const LONGEST_NOW = 4_000;

/**
 * What stands around a span.
 *
 * @param text - of one section
 * @param span - in that text
 * @example contextOf('The jet breaks.', { from: 4, to: 7 }).after // => ' breaks.\u0003'
 */
export function contextOf(text: string, { from, to }: Span): { before: string; after: string } {
  return {
    before: `${START}${text.slice(0, from)}`.slice(-CONTEXT_LENGTH),
    after: `${text.slice(to)}${END}`.slice(0, CONTEXT_LENGTH),
  };
}

/**
 * The one place in a section where these words stand in their context; null where they do not, or where two places
 * would do.
 *
 * @param text - of one section
 * @param wanted - the words, with context as contextOf gave it
 * @example findQuote('The jet breaks.', { quote: 'jet', before: '\u0002The ', after: ' breaks.\u0003' }) // => { from: 4, to: 7 }
 * @example findQuote('A jet and a jet', { quote: 'jet', before: '\u0002The ', after: ' breaks.\u0003' }) // => null
 */
export function findQuote(text: string, wanted: QuoteInContext): Span | null {
  const found = occurrences(text, wanted.quote)
    .map((span) => ({ span, score: scoreOf(text, span, wanted) }))
    .sort((a, b) => b.score - a.score);
  const [best, second] = found;
  if (!best || best.score < LEAST_CONTEXT) return null;
  return second && best.score - second.score < CLEAR_BY ? null : best.span;
}

/**
 * Every place where words stand, whatever is around them.
 *
 * @example occurrences('a jet, the jet', 'jet').length // => 2
 */
export function occurrences(text: string, quote: string): readonly Span[] {
  const spans: Span[] = [];
  if (quote === '') return spans;
  for (let from = text.indexOf(quote); from >= 0; from = text.indexOf(quote, from + 1))
    spans.push({ from, to: from + quote.length });
  return spans;
}

/**
 * Whether what now stands between a note's two positions is still what the note is about.
 *
 * @param quote - the words when the note was written
 * @param now - the words between its positions now
 * @example isStillSaid('drag on the broken jet', 'drag on the jet') // => true
 * @example isStillSaid('drag on the broken jet', 'the opposite') // => false
 */
export function isStillSaid(quote: string, now: string): boolean {
  if (quote === now) return now !== '';
  if (now.length > LONGEST_NOW) return false;
  const words = wordsOf(quote);
  const kept = commonInOrder(words, wordsOf(now));
  return kept > 0 && kept >= words.length * LEAST_KEPT;
}

function scoreOf(text: string, span: Span, wanted: QuoteInContext): number {
  const there = contextOf(text, span);
  const length = wanted.before.length + wanted.after.length;
  if (length === 0) return 0;
  const before = agreeing(reversed(wanted.before), reversed(there.before));
  return (before + agreeing(wanted.after, there.after)) / length;
}

/** How many signs agree before the first that does not. */
function agreeing(wanted: string, there: string): number {
  let length = 0;
  while (length < wanted.length && wanted[length] === there[length]) length += 1;
  return length;
}

function reversed(text: string): string {
  return text.split('').reverse().join('');
}

function wordsOf(text: string): readonly string[] {
  return text.match(/[\p{L}\p{N}]+|[^\s\p{L}\p{N}]/gu) ?? [];
}

/** Length of the longest run of words that both have in the same order, others between them. */
function commonInOrder(a: readonly string[], b: readonly string[]): number {
  let row = new Array<number>(b.length + 1).fill(0);
  for (const word of a) {
    const next = [0];
    b.forEach((other, index) => {
      const longest =
        word === other ? (row[index] ?? 0) + 1 : Math.max(row[index + 1] ?? 0, next[index] ?? 0);
      next.push(longest);
    });
    row = next;
  }
  return row.at(-1) ?? 0;
}
