import type { Reading } from '#shared/evidence/evidence.ts';
import { unitToText } from '#shared/formatting/unit-text.ts';

/** A reading as it was typed, with a true minus; its unit only where it is not `headUnit`: "46.1", "38°", "447 mm". */
export function showTyped(reading: Reading, headUnit?: string): string {
  const number = reading.text.trim().replace(/^-/, '\u2212');
  const own = reading.u === undefined ? number : `${number} ± ${reading.u}`;
  if (reading.unit === '1' || reading.unit === headUnit) return own;
  return reading.unit === '°' ? `${own}°` : `${own}\u00a0${unitToText(reading.unit)}`;
}
