import type { Reading } from '#shared/evidence/evidence.ts';
import { parseUnit } from '#shared/units/parse-unit.ts';
import { unitGap, unitSigns } from '#shared/units/unit-signs.ts';

/**
 * A reading as it was typed, set with its unit: `45°`, `20.0 cm`, `−3 cm`.
 *
 * @param reading - as entered; its own uncertainty is left out
 * @example readingText({ text: '45', unit: '°' }) // => '45°'
 * @example readingText({ text: '-0,3', unit: 'cm' }) // => '−0.3\u00A0cm'
 */
export function readingText(reading: Reading): string {
  const figures = readingFigures(reading);
  const parsed = parseUnit(reading.unit);
  if (!parsed.ok) return `${figures}\u00A0${reading.unit}`;
  return figures + unitGap(parsed.unit) + unitSigns(parsed.unit);
}

/**
 * The figures alone: a point for a comma, a true minus.
 *
 * @example readingFigures({ text: '-0,3', unit: 'cm' }) // => '−0.3'
 */
export function readingFigures({ text }: Reading): string {
  return text.trim().replace(',', '.').replace(/^-/u, '−');
}
