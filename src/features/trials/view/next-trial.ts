import type { Evidence, Quantity, Reading, Series } from '#shared/evidence/evidence.ts';
import { parseTypedNumber } from '#shared/units/typed-number.ts';

/** One field of the entry bar. */
export interface EntryField {
  readonly quantity: Quantity;
  readonly kind: 'setting' | 'reading';
}

/** What stands in the entry bar, by quantity id, as typed. */
export type EntryText = Readonly<Record<string, string>>;

/** What was understood of the entry bar. */
export interface EntryReading {
  readonly values: Readonly<Record<string, Reading>>;
  /** Sentences by quantity id, for fields that hold something that cannot be understood. */
  readonly faults: Readonly<Record<string, { sentence: string; mend: string | null }>>;
  /** Fields still empty. */
  readonly missing: readonly string[];
  /** What was understood where it is not simply what was typed: "447 mm". */
  readonly understood: Readonly<Record<string, string>>;
}

export function entryFields(series: Series, evidence: Evidence): EntryField[] {
  const byId = new Map(evidence.quantities.map((quantity) => [quantity.id, quantity]));
  const fields = (ids: readonly string[], kind: EntryField['kind']) =>
    ids.flatMap((id) => {
      const quantity = byId.get(id);
      return quantity ? [{ quantity, kind }] : [];
    });
  return [...fields(series.settings, 'setting'), ...fields(series.readings, 'reading')];
}

/** Key of a field's own uncertainty among the typed texts. */
export const uncertaintyKey = (quantity: string) => `${quantity} u`;

/** Settings as in the last trial of the series; readings empty; uncertainties as last typed. */
export function firstText(series: Series, evidence: Evidence): EntryText {
  const last = evidence.trials
    .filter((trial) => trial.series === series.id && !trial.withdrawn)
    .reduce<(typeof evidence.trials)[number] | null>(
      (latest, trial) => (!latest || trial.order > latest.order ? trial : latest),
      null,
    );
  const text: Record<string, string> = {};
  const unitOf = new Map(evidence.quantities.map(({ id, unit }) => [id, unit]));
  for (const id of [...series.settings, ...series.readings]) {
    const reading = last?.values[id];
    const isSetting = series.settings.includes(id);
    text[id] = reading && isSetting ? withUnitIfOther(reading, unitOf.get(id)) : '';
    text[uncertaintyKey(id)] = reading?.u !== undefined && reading.unit === unitOf.get(id) ? reading.u : '';
  }
  return text;
}

function withUnitIfOther(reading: Reading, unit: string | undefined): string {
  return reading.unit === unit ? reading.text : `${reading.text} ${reading.unit}`;
}

/** Reads the bar; nothing is corrected in silence. */
export function readEntry(fields: readonly EntryField[], text: EntryText): EntryReading {
  const values: Record<string, Reading> = {};
  const faults: Record<string, { sentence: string; mend: string | null }> = {};
  const understood: Record<string, string> = {};
  const missing: string[] = [];
  for (const { quantity } of fields) {
    const typed = (text[quantity.id] ?? '').trim();
    const typedU = (text[uncertaintyKey(quantity.id)] ?? '').trim();
    if (typed === '') {
      missing.push(quantity.id);
      continue;
    }
    const parsed = parseTypedNumber(typed, quantity.unit);
    if (!parsed.ok) {
      faults[quantity.id] = { sentence: parsed.sentence, mend: parsed.mend };
      continue;
    }
    if (typedU !== '' && parsed.reading.u === undefined) {
      const withU = parseTypedNumber(`${parsed.reading.text} ± ${typedU}`, parsed.reading.unit);
      if (!withU.ok) {
        faults[quantity.id] = { sentence: withU.sentence, mend: null };
        continue;
      }
      values[quantity.id] = withU.reading;
    } else values[quantity.id] = parsed.reading;
    if (parsed.reading.unit !== quantity.unit || parsed.reading.text !== typed) {
      understood[quantity.id] = parsed.understood;
    }
  }
  return { values, faults, missing, understood };
}
