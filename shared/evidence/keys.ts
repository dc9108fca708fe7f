import { readSi } from '#shared/units/reading.ts';
import type { Reading, ValueReference } from './evidence.ts';

/**
 * The name under which a referenced value is found and subscribed to: equal references have equal keys.
 *
 * Forms: `q`, `q@series`, `q@series{setting=value}` (a mean), `model:q@series{setting=value}` (a prediction),
 * `trial:q` behind `reading:`, `fit:…`, `claim:…`, `count:…`, `(a)-(b)`. Values of settings are exact in SI, so
 * that 38 and 38.0 name the same group.
 *
 * @example keyOf({ kind: 'quantity', quantity: 'q7', series: 'sB' }) // => 'q7@sB'
 * @example keyOf({ kind: 'reading', trial: 't1', quantity: 'q7' }) // => 'reading:t1:q7'
 */
export function keyOf(ref: ValueReference): string {
  switch (ref.kind) {
    case 'quantity':
      return quantityKey(ref.quantity, ref.series);
    case 'mean':
      return quantityKey(ref.quantity, ref.series) + settingsKey(ref.at);
    case 'prediction':
      return predictionKey(ref.model, ref.quantity, ref.series) + settingsKey(ref.at);
    case 'reading':
      return `reading:${ref.trial}:${ref.quantity}`;
    case 'fit':
      return `fit:${ref.comparison}:${ref.figure}`;
    case 'claim':
      return `claim:${ref.claim}:${ref.figure}`;
    case 'count':
      return `count:${ref.of}:${ref.series ?? ''}:${ref.comparison ?? ''}`;
    case 'difference':
      return `(${keyOf(ref.a)})-(${keyOf(ref.b)})`;
  }
}

/**
 * Key of a register value: the one it has, or its value inside a series.
 *
 * @example quantityKey('q7', undefined) // => 'q7'
 */
export function quantityKey(quantity: string, series: string | undefined): string {
  return series === undefined ? quantity : `${quantity}@${series}`;
}

/**
 * Key of what a model predicts for a quantity in a series.
 *
 * @example predictionKey('m3', 'q7', 'sB') // => 'm3:q7@sB'
 */
export function predictionKey(model: string, quantity: string, series: string): string {
  return `${model}:${quantityKey(quantity, series)}`;
}

/**
 * Part of a key that names a setting: `{q1=value,q2=value}` in the order of the ids, empty without settings.
 *
 * @example settingsKey({}) // => ''
 */
export function settingsKey(at: Readonly<Record<string, Reading>>): string {
  const ids = Object.keys(at).sort();
  if (ids.length === 0) return '';
  return `{${ids.map((id) => `${id}=${readingKey(at[id])}`).join(',')}}`;
}

/**
 * Exact name of a reading's value in SI; a reading that cannot be read is named by its text.
 *
 * @example readingKey({ text: '38.0', unit: '1' }) === readingKey({ text: '38', unit: '1' }) // => true
 */
export function readingKey(reading: Reading | undefined): string {
  if (reading === undefined) return '';
  const read = readSi(reading);
  return read.ok ? read.key : `?${reading.text} ${reading.unit}`;
}
