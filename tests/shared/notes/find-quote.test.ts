import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { contextOf, findQuote, isStillSaid, occurrences } from '#shared/notes/find-quote.ts';

const TEXT =
  'We put this down to drag on the broken jet, which the model leaves out.\nThe drag on the broken jet grows with the length of flight.';
const QUOTE = 'drag on the broken jet';

function noteOn(text: string, from: number, quote = QUOTE) {
  return { quote, ...contextOf(text, { from, to: from + quote.length }) };
}

describe('findQuote', () => {
  const first = TEXT.indexOf(QUOTE);
  const second = TEXT.lastIndexOf(QUOTE);

  test('when the same words stand twice: each note is found at its own place', () => {
    expect(findQuote(TEXT, noteOn(TEXT, first))?.from).toBe(first);
    expect(findQuote(TEXT, noteOn(TEXT, second))?.from).toBe(second);
  });

  test('when its words are deleted and stand elsewhere too: does not jump to the others', () => {
    const deleted = TEXT.slice(0, first) + TEXT.slice(first + QUOTE.length);

    expect(occurrences(deleted, QUOTE)).toHaveLength(1);
    expect(findQuote(deleted, noteOn(TEXT, first))).toBeNull();
  });

  test('when a paragraph is written above: follows', () => {
    const above = `A new first paragraph, as long as one likes.\n${TEXT}`;

    expect(findQuote(above, noteOn(TEXT, second))?.from).toBe(second + above.length - TEXT.length);
  });

  test('when a paragraph was copied whole: refuses both, for neither is the one', () => {
    const context = 'Long enough to fill all of the context before the words: ';
    const line = `${context}${QUOTE} and all of the context that follows after the words.\n`;
    const note = noteOn(line, context.length);

    expect(findQuote(`${line}${line}`, note)).toBeNull();
  });

  test('when there are no words, or no text: finds nothing', () => {
    expect(findQuote(TEXT, { quote: '', before: '', after: '' })).toBeNull();
    expect(findQuote('', noteOn(TEXT, first))).toBeNull();
  });

  test('of any text and any place in it: finds that very place or nothing', () => {
    fc.assert(
      fc.property(
        fc.string({ unit: fc.constantFrom('a', 'b', ' ', '\n'), minLength: 1, maxLength: 200 }),
        fc.nat(),
        fc.integer({ min: 1, max: 12 }),
        (text, at, length) => {
          const from = at % text.length;
          const quote = text.slice(from, from + length);
          const found = findQuote(text, noteOn(text, from, quote));
          if (found) expect(found).toEqual({ from, to: from + quote.length });
        },
      ),
    );
  });

  test('of any text from which its words were cut: what is found has most of the context, never another', () => {
    const word = fc.constantFrom('jet', 'head', 'lean', 'the', 'range');
    fc.assert(
      fc.property(
        fc.array(word, { minLength: 24, maxLength: 40 }),
        fc.integer({ min: 10, max: 13 }),
        (words, at) => {
          const from = words.slice(0, at).join(' ').length + 1;
          const quote = words[at] ?? '';
          const text = words.join(' ');
          const note = noteOn(text, from, quote);
          const cut = text.slice(0, from) + text.slice(from + quote.length + 1);
          const found = findQuote(cut, note);
          if (!found) return;
          const there = contextOf(cut, found);
          // Only a text that repeats itself around the cut may be found again.
          expect(
            there.before.slice(-24) === note.before.slice(-24) ||
              there.after.slice(0, 24) === note.after.slice(0, 24),
          ).toBe(true);
        },
      ),
    );
  });
});

describe('isStillSaid', () => {
  test.each([
    ['drag on the broken jet', true],
    ['drag on the freshly broken jet', true],
    ['drag on the jet', true],
    ['', false],
    ['surface tension', false],
    ['jet broken the on drag', false],
  ])('when "drag on the broken jet" now reads "%s": %s', (now, expected) => {
    expect(isStillSaid(QUOTE, now)).toBe(expected);
  });

  test('of any words: they are themselves', () => {
    fc.assert(fc.property(fc.string({ minLength: 1 }), (text) => isStillSaid(text, text)));
  });
});
