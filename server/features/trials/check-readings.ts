import type { Evidence, Reading, Series } from '#shared/evidence/evidence.ts';
import { sameDimension } from '#shared/units/dimension.ts';
import { parseUnit } from '#shared/units/parse-unit.ts';
import { readSi } from '#shared/units/reading.ts';
import { AppError } from '#server/errors/app-error.ts';

/** A trial about to be stored. */
export interface TrialReadings {
  /** How people know it ("B12"), or its place in the batch. */
  readonly name: string;
  /** Path of its values in the request, for `fields`. */
  readonly path: string;
  readonly values: Readonly<Record<string, Reading>>;
}

/** Refuses readings that cannot be understood: 422 `reading-refused`, naming the trial and the quantity. */
export function assertReadings(trials: readonly TrialReadings[], series: Series, evidence: Evidence): void {
  for (const trial of trials) {
    for (const [id, reading] of Object.entries(trial.values)) {
      const refusal = refusalOf(id, reading, series, evidence);
      if (refusal) throw refused(trial, id, refusal);
    }
    assertComplete(trial, series, evidence);
  }
}

interface Refusal {
  readonly symbol: string;
  readonly field: 'text' | 'unit' | 'u';
  readonly sentence: string;
}

function refusalOf(id: string, reading: Reading, series: Series, evidence: Evidence): Refusal | null {
  const quantity = evidence.quantities.find((candidate) => candidate.id === id);
  if (!quantity || !(series.settings.includes(id) || series.readings.includes(id))) {
    const sentence = `it is neither set nor read in series ${series.letter}.`;
    return { symbol: quantity?.symbol ?? 'a quantity', field: 'text', sentence };
  }
  const read = readSi(reading);
  if (!read.ok) return { symbol: quantity.symbol, field: read.field, sentence: read.sentence };
  const unit = parseUnit(quantity.unit);
  if (unit.ok && !sameDimension(unit.unit.dimension, read.dimension)) {
    const sentence = `${reading.unit || '1'} does not measure what ${quantity.unit} measures. Write it in ${quantity.unit}.`;
    return { symbol: quantity.symbol, field: 'unit', sentence };
  }
  return null;
}

/** Trials are grouped by their settings, so each needs all of them, and at least one reading beside. */
function assertComplete(trial: TrialReadings, series: Series, evidence: Evidence): void {
  const missing = series.settings.find((id) => !(id in trial.values));
  if (missing !== undefined) {
    const symbol = evidence.quantities.find(({ id }) => id === missing)?.symbol ?? 'a setting';
    throw refused(trial, missing, {
      symbol,
      field: 'text',
      sentence: `its value is missing. Trials of series ${series.letter} are grouped by it.`,
    });
  }
  if (!series.readings.some((id) => id in trial.values)) {
    const sentence = `${trial.name} has no reading. Write at least one.`;
    throw new AppError(422, 'reading-refused', sentence, { fields: { [trial.path]: sentence } });
  }
}

function refused(trial: TrialReadings, id: string, { symbol, field, sentence }: Refusal): AppError {
  return new AppError(422, 'reading-refused', `${trial.name}, ${symbol}: ${sentence}`, {
    fields: { [`${trial.path}.${id}.${field}`]: sentence },
  });
}
