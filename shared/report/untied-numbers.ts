/** Numbers that were typed by hand and so follow no trial: the ones that look unfinished until they are tied. */
import type { Evidence, Reading } from '#shared/evidence/evidence.ts';
import { formatDimension } from '#shared/units/dimension.ts';
import { parseUnit } from '#shared/units/parse-unit.ts';
import { readSi } from '#shared/units/reading.ts';

/** Where an untied number stands in a run of text: half-open range of UTF-16 positions. */
export interface UntiedNumber {
  readonly from: number;
  readonly to: number;
  readonly text: string;
}

/** Values that only name a setting ("at 38°"), by settingKey: naming one is no statement about the world. */
export type SettingNames = ReadonlySet<string>;

const DIGITS = '\\d+(?:[.,]\\d+)*';
const TYPED = new RegExp(
  `(?<![\\p{L}\\d_.,/])[-\u2212]?${DIGITS}(?:\\s?(?:±|\\+-)\\s?${DIGITS})?(?:[\\s\u00a0\u202f]?(?<unit>[°%‰]C?|[\\p{L}µΩ][\\p{L}µΩ\\d^⁻⁰¹²³⁴/·]*))?`,
  'gu',
);
/** Words that are units too, but after a number in a sentence are words; and u, which counts uncertainties. */
const NOT_UNITS = new Set(['u', 'a', 'at', 'in', 'as', 'd', 'per', 'k', 'x', 'e', 't']);
/** Before a number, these make it a name: "Figure 4", "model 3". */
const NAMED_BY =
  /(?:figures?|tables?|plates?|formulas?|claims?|models?|sections?|series|trials?|fights?|editions?|problems?|steps?|rigs?)[\s\u00a0]$/i;

/**
 * Finds the typed numbers of a run of text that should be tied. A number counts when it has a unit, or figures after
 * a decimal mark, or ±. Whole numbers alone (counts, years, list numbers), numbers that name a figure, a model or the
 * like, "2 u", and values that are a setting of a series or a limit of a model are left alone.
 *
 * @param text - plain text; formulas and live values are not part of it
 * @param settings - see settingNames
 * @example untiedNumbers('It is 3.2 cm in 12 trials, see Figure 4.', new Set()).map(({ text }) => text) // => ['3.2 cm']
 */
export function untiedNumbers(text: string, settings: SettingNames): UntiedNumber[] {
  const found: UntiedNumber[] = [];
  for (const match of text.matchAll(TYPED)) {
    const unit = unitOf(match.groups?.unit);
    const number =
      unit === null
        ? match[0].slice(0, match[0].length - (match.groups?.unit?.length ?? 0)).trimEnd()
        : match[0];
    const isStatement = unit !== null || /[.,]\d/.test(number) || /±|\+-/.test(number);
    if (!isStatement || NAMED_BY.test(text.slice(0, match.index))) continue;
    if (unit !== null && settings.has(settingKey(number.slice(0, number.length - unit.length), unit)))
      continue;
    found.push({ from: match.index, to: match.index + number.length, text: number });
  }
  return found;
}

/** The unit that follows a number, or null where the word after it is none. */
function unitOf(word: string | undefined): string | null {
  if (word === undefined || NOT_UNITS.has(word)) return null;
  return parseUnit(word).ok ? word : null;
}

/**
 * Every value that only names where trials were taken: settings, what series hold, and the ends of limits.
 *
 * @param evidence - the problem's
 */
export function settingNames(evidence: Evidence): SettingNames {
  const names = new Set<string>();
  const add = (reading: Reading | null | undefined) => {
    if (reading) names.add(settingKey(reading.text, reading.unit));
  };
  for (const { held } of evidence.series) Object.values(held).forEach(add);
  const settings = new Map(evidence.series.map((series) => [series.id, series.settings]));
  for (const trial of evidence.trials) {
    for (const id of settings.get(trial.series) ?? []) add(trial.values[id]);
  }
  for (const { limits } of evidence.models) {
    for (const { min, max } of limits) {
      add(min);
      add(max);
    }
  }
  return names;
}

/** One value, one key, however it is written: 20 cm, 20.0 cm and 200 mm are the same. */
function settingKey(number: string, unit: string): string {
  const text = number.trim().replace('\u2212', '-');
  const read = readSi({ text, unit });
  return read.ok ? `${read.key} ${formatDimension(read.dimension)}` : `${text} ${unit}`;
}
