import type { Evidence, Series } from '#shared/evidence/evidence.ts';
import type { Fields } from './fields.ts';
import { checkReadings } from './numbers.ts';
import { checkReference, checkReferences } from './references.ts';

/** A quantity is held, set or read in a series, never two of these. */
export function checkSeries(series: Series, evidence: Evidence, fields: Fields): Series {
  for (const id of Object.keys(series.held)) {
    checkReference(evidence, 'quantities', id, `row.held.${id}`, fields);
  }
  checkReadings(series.held, 'row.held', fields);
  checkReferences(evidence, 'quantities', series.settings, 'row.settings', fields);
  checkReferences(evidence, 'quantities', series.readings, 'row.readings', fields);
  series.settings.forEach((id, index) => {
    if (id in series.held || series.settings.indexOf(id) < index) {
      fields.refuse(`row.settings.${index}`, 'This is held fixed or set already. Keep it in one place.');
    }
  });
  series.readings.forEach((id, index) => {
    if (id in series.held || series.settings.includes(id) || series.readings.indexOf(id) < index) {
      fields.refuse(`row.readings.${index}`, 'This is held, set or read already. Keep it in one place.');
    }
  });
  return series;
}
