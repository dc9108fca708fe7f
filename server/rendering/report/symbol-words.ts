import type { TextRun } from '../text/inline-run.ts';
import { textStyle, type TextFace } from './print-style.ts';

/** Letters of computed sentences: uncertainty, probability, difference over uncertainty. */
const LETTERS: ReadonlySet<string> = new Set(['u', 'p', 'z']);
/** Symbols that are words of their own, too. */
const WORDS: ReadonlySet<string> = new Set(['a', 'A', 'I']);
const WORD = /([\p{L}][\p{L}_]*)/u;

/**
 * A computed sentence with its symbols in the report's italic.
 *
 * @param symbols - symbols of the register that may stand in it
 */
export function symbolWords(text: string, face: TextFace, symbols: ReadonlySet<string> = LETTERS): TextRun[] {
  return text
    .split(WORD)
    .filter((piece) => piece !== '')
    .map((piece) => {
      const isSymbol = LETTERS.has(piece) || (symbols.has(piece) && !WORDS.has(piece));
      return { kind: 'text', text: piece, style: textStyle(face, isSymbol ? 'bodyItalic' : face.regular) };
    });
}
