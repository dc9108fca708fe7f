/** Typed numbers, units and stated uncertainties: whether they can be read at all. What they mean together is evaluated later. */
import { decimalToNumber, parseDecimal } from '#shared/numeric/decimal.ts';
import { parseUnit } from '#shared/units/parse-unit.ts';
import { readSi } from '#shared/units/reading.ts';
import type { Range, Reading, UncertaintyPart } from '#shared/evidence/evidence.ts';
import type { Fields } from './fields.ts';

export function checkUnit(unit: string, path: string, fields: Fields): void {
  const parsed = parseUnit(unit);
  if (!parsed.ok) fields.refuse(path, parsed.sentence);
}

export function checkReading(reading: Reading | null, path: string, fields: Fields): void {
  if (reading === null) return;
  const read = readSi(reading);
  if (!read.ok) fields.refuse(`${path}.${read.field}`, read.sentence);
}

export function checkReadings(
  readings: Readonly<Record<string, Reading>>,
  path: string,
  fields: Fields,
): void {
  for (const [id, reading] of Object.entries(readings)) checkReading(reading, `${path}.${id}`, fields);
}

/** Both ends can be read, and the lower is not above the upper. */
export function checkRange(range: Range, path: string, fields: Fields): void {
  checkReading(range.min, `${path}.min`, fields);
  checkReading(range.max, `${path}.max`, fields);
  if (!range.min || !range.max) return;
  const [min, max] = [readSi(range.min), readSi(range.max)];
  if (min.ok && max.ok && min.value > max.value) {
    fields.refuse(`${path}.min.text`, 'The lower end is above the upper end. Exchange the two.');
  }
}

export function checkParts(parts: readonly UncertaintyPart[], path: string, fields: Fields): void {
  parts.forEach((part, index) => {
    const at = `${path}.${index}`;
    if (part.kind !== 'scale') checkUnit(part.unit, `${at}.unit`, fields);
    const amount = parseDecimal(part.amount);
    if (amount === null || !Number.isFinite(decimalToNumber(amount))) {
      fields.refuse(`${at}.amount`, `“${part.amount}” is not a number. Write it like 0.05.`);
    } else if (amount.digits <= 0n) {
      fields.refuse(
        `${at}.amount`,
        `An uncertainty must be more than 0, not ${part.amount}. Remove the line where there is none.`,
      );
    }
  });
}
