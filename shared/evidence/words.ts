const NUMBER_WORDS = [
  'no',
  'one',
  'two',
  'three',
  'four',
  'five',
  'six',
  'seven',
  'eight',
  'nine',
  'ten',
  'eleven',
  'twelve',
];

/**
 * A count in words up to twelve, in figures beyond.
 *
 * @example countInWords(4) // => 'four'
 * @example countInWords(13) // => '13'
 */
export function countInWords(count: number): string {
  return NUMBER_WORDS[count] ?? String(count);
}

/**
 * Names in a row, as one writes them.
 *
 * @example listInWords(['A1', 'A2', 'B3']) // => 'A1, A2 and B3'
 */
export function listInWords(names: readonly string[]): string {
  if (names.length < 2) return names.join('');
  return `${names.slice(0, -1).join(', ')} and ${names.at(-1) ?? ''}`;
}

/**
 * The first letter as a capital, for the start of a sentence.
 *
 * @example startSentence('four of seven') // => 'Four of seven'
 */
export function startSentence(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}

/**
 * A count with its noun.
 *
 * @example counted(1, 'trial') // => '1 trial'
 * @example counted(3, 'trial') // => '3 trials'
 */
export function counted(count: number, noun: string): string {
  return `${count} ${noun}${count === 1 ? '' : 's'}`;
}

const MINUS = '\u2212';

/**
 * A figure of a test (z, χ²) to one decimal place, or to three digits from 100 on.
 *
 * @example figureInWords(-2.31) // => '−2.3'
 * @example figureInWords(1822.4) // => '1820'
 */
export function figureInWords(value: number): string {
  const size = Math.abs(value);
  const text =
    size >= 1e6 ? size.toExponential(1) : size >= 100 ? String(Number(size.toPrecision(3))) : size.toFixed(1);
  return value < 0 && Number(text) !== 0 ? MINUS + text : text;
}

/**
 * A p-value to two digits, or the bound below which it lies.
 *
 * @example pValueInWords(0.0234) // => 'p = 0.023'
 * @example pValueInWords(1e-9) // => 'p < 0.0001'
 */
export function pValueInWords(p: number): string {
  if (p < 1e-4) return 'p < 0.0001';
  return `p = ${p > 0.995 ? p.toFixed(4) : String(Number(p.toPrecision(2)))}`;
}
