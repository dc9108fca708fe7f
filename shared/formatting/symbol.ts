import { findGreekLetter } from './greek-letters.ts';

/** A symbol taken apart: `C_v` is C with v below it. The letter is a sign, never a Greek name. */
export interface SymbolParts {
  readonly letter: string;
  /** Words and labels stand upright below the letter; a Greek name here is given as its sign. */
  readonly sub: string | null;
}

const FORM = /^(\p{L}+)(?:_(?:\{([\p{L}\p{Nd},]+)\}|([\p{L}\p{Nd}]+)))?$/u;

/**
 * Letter and subscript of a symbol: one letter, or a Greek letter by sign or name, then an optional `_sub`.
 *
 * @returns null when the text has another form
 * @example splitSymbol('theta_max') // => { letter: 'θ', sub: 'max' }
 * @example splitSymbol('speed') // => null
 */
export function splitSymbol(symbol: string): SymbolParts | null {
  const match = FORM.exec(symbol.trim());
  if (match?.[1] === undefined) return null;
  const letter = findGreekLetter(match[1])?.sign ?? match[1];
  if ([...letter].length !== 1) return null;
  const sub = match[2] ?? match[3];
  return { letter, sub: sub === undefined ? null : (findGreekLetter(sub)?.sign ?? sub) };
}

/**
 * The one way of writing a symbol that all its spellings share; texts of another form come back as they are.
 *
 * @example symbolToText('theta_{max}') // => 'θ_max'
 * @example symbolToText('µ') // => 'μ'
 */
export function symbolToText(symbol: string): string {
  const parts = splitSymbol(symbol);
  if (parts === null) return symbol;
  return parts.sub === null ? parts.letter : `${parts.letter}_${parts.sub}`;
}

/**
 * Whether two texts name one symbol: `theta` and `θ`, `R_max` and `R_{max}`.
 *
 * @example sameSymbol('theta_0', 'ϑ_0') // => true
 */
export function sameSymbol(a: string, b: string): boolean {
  return symbolToText(a) === symbolToText(b);
}

/**
 * A symbol in LaTeX: letter in italics, subscript upright (ISO 80000-1, 7.1.2).
 *
 * @example symbolToLatex('C_v') // => 'C_{\\mathrm v}'
 * @example symbolToLatex('theta_max') // => '\\theta_{\\mathrm{max}}'
 * @example symbolToLatex('v_0') // => 'v_{0}'
 */
export function symbolToLatex(symbol: string): string {
  const parts = splitSymbol(symbol);
  if (parts === null) return `\\mathit{${symbol.replace(/[^\p{L}\p{Nd} ]/gu, '')}}`;
  const letter = findGreekLetter(parts.letter)?.latex ?? parts.letter;
  return parts.sub === null ? letter : `${letter}_{${subscript(parts.sub)}}`;
}

/**
 * A symbol in words, to be read aloud.
 *
 * @example symbolToSpeech('C_v') // => 'C sub v'
 * @example symbolToSpeech('θ') // => 'theta'
 */
export function symbolToSpeech(symbol: string): string {
  const parts = splitSymbol(symbol);
  if (parts === null) return symbol;
  const letter = spokenLetter(parts.letter);
  return parts.sub === null ? letter : `${letter} sub ${spokenLetter(parts.sub)}`;
}

/** Names that expressions keep for themselves. */
const RESERVED = new Set(['π']);

/**
 * Why a text cannot be a quantity's symbol, in a sentence; null when it can.
 *
 * @example symbolFault('C_v') // => null
 * @example symbolFault('speed') // => 'A symbol is one letter, then perhaps _ and a label. Write s_peed or choose another letter.'
 */
export function symbolFault(symbol: string): string | null {
  const trimmed = symbol.trim();
  if (trimmed === '') return 'Give it a symbol: one letter, then perhaps _ and a label, like v or v_t.';
  const parts = splitSymbol(trimmed);
  if (parts !== null) {
    return RESERVED.has(parts.letter) && parts.sub === null
      ? 'π is kept for the number 3.14159…. Choose another letter, or add a label: π_1.'
      : null;
  }
  const word = /^(\p{L})[_ ]?([\p{L}\p{Nd}]+)$/u.exec(trimmed);
  const mend =
    word === null ? 'Write it like v, v_t or θ_0.' : `Write ${word[1]}_${word[2]} or choose another letter.`;
  return `A symbol is one letter, then perhaps _ and a label. ${mend}`;
}

function subscript(sub: string): string {
  const greek = findGreekLetter(sub);
  if (greek !== null) return greek.latex;
  if (/^\d+$/u.test(sub)) return sub;
  return [...sub].length === 1 ? `\\mathrm ${sub}` : `\\mathrm{${sub}}`;
}

function spokenLetter(text: string): string {
  const greek = findGreekLetter(text);
  if (greek === null) return text;
  return greek.name === greek.name.toLowerCase() ? greek.name : `capital ${greek.name.toLowerCase()}`;
}
