import type { Reading } from '#shared/evidence/evidence.ts';
import { parseUnit } from '#shared/units/parse-unit.ts';

/** What the sentence so far says about the value that comes next. */
export interface SentenceHints {
  /** Numbers in the sentence, the nearest to its end first, each with its unit where one stands behind it. */
  readonly numbers: readonly { readonly text: string; readonly unit: string | null }[];
  /** Names of trials: "B12". */
  readonly trials: readonly string[];
  readonly leaning: 'measured' | 'predicted' | 'difference';
}

const NUMBER = /(?<![\p{L}\p{N}.])([−-]?\d+(?:[.,]\d+)?)[ \u00A0]?(°|%|[\p{L}°%][\p{L}°/^·²³⁻¹]{0,8})?/gu;
const PREDICTED = /\b(predict\w*|model\w*|expect\w*|should|theor\w*|calculat\w*|comput\w*)\b/giu;
const DIFFERENCE =
  /\b(short|shortfall|differ\w*|gap|below|above|apart|miss\w*|residual|deviat\w*|beyond)\b/giu;
const MEASURED = /\b(find|found|measure\w*|observe\w*|mean|read|trials?)\b/giu;

/**
 * Reads a sentence for what the next value may be about.
 *
 * @param context - text before the caret
 * @example sentenceHints('At 45° we find').numbers[0] // => { text: '45', unit: '°' }
 * @example sentenceHints('the model predicts').leaning // => 'predicted'
 */
export function sentenceHints(context: string): SentenceHints {
  const numbers = [...context.matchAll(NUMBER)].reverse().map(([, text = '', unit]) => ({
    text: text.replace(',', '.').replace('−', '-'),
    unit: unit !== undefined && parseUnit(unit).ok ? unit : null,
  }));
  const trials = [...context.matchAll(/\b[A-Z]{1,2}\d+\b/gu)].map(([name]) => name).reverse();
  const last = lastPlaces(context);
  const leaning = (['predicted', 'difference'] as const).reduce<SentenceHints['leaning']>(
    (best, kind) => (last[kind] > last[best] ? kind : best),
    'measured',
  );
  return { numbers, trials, leaning };
}

function lastPlaces(context: string): Record<SentenceHints['leaning'], number> {
  return {
    measured: lastPlace(context, MEASURED),
    predicted: lastPlace(context, PREDICTED),
    difference: lastPlace(context, DIFFERENCE),
  };
}

function lastPlace(context: string, words: RegExp): number {
  return [...context.matchAll(words)].at(-1)?.index ?? -1;
}

/**
 * How near a setting stands to the end of the sentence: 0 is the last number of it; Infinity: not in the sentence.
 *
 * @param at - a setting, by quantity
 * @example nearness({ q1: { text: '45', unit: '°' } }, sentenceHints('at 30° and at 45°')) // => 0
 */
export function nearness(at: Readonly<Record<string, Reading>>, hints: SentenceHints): number {
  const places = Object.values(at).map(({ text, unit }) => {
    const place = hints.numbers.findIndex(
      (number) =>
        Number(number.text) === Number(text.replace(',', '.')) &&
        (number.unit === null || number.unit === unit),
    );
    return place === -1 ? Infinity : place;
  });
  return Math.min(Infinity, ...places);
}
