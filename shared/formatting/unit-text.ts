import { parseUnit } from '#shared/units/parse-unit.ts';
import type { Unit } from '#shared/units/unit.ts';
import { unitSigns } from '#shared/units/unit-signs.ts';

/**
 * A unit as it is printed: `m s⁻²`, `°`, and nothing for a pure number. A text that is no unit comes back as it is.
 *
 * @param unit - a unit's text as the register has it
 * @example unitToText('cm^2') // => 'cm²'
 * @example unitToText('1') // => ''
 */
export function unitToText(unit: string): string {
  const parsed = parseUnit(unit);
  return parsed.ok ? unitSigns(parsed.unit) : unit;
}

/**
 * The unit behind a register's text, for formatting, where a bad one is a mistake of the caller.
 *
 * @throws RangeError when the text is no unit
 * @example requireUnit('cm').scale // => 0.01
 */
export function requireUnit(text: string): Unit {
  const parsed = parseUnit(text);
  if (!parsed.ok) throw new RangeError(`requireUnit: needs a unit, got ${text}`);
  return parsed.unit;
}
