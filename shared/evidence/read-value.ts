import { parseUnit } from '#shared/units/parse-unit.ts';
import { readSi, type SiReading } from '#shared/units/reading.ts';
import type { Unit } from '#shared/units/unit.ts';
import type { Reading } from './evidence.ts';

/** A reading in SI, or the reason why it cannot be read. */
export type ReadValue =
  | { readonly ok: true; readonly value: number; readonly u: number | null; readonly unit: Unit }
  | Extract<SiReading, { ok: false }>;

const PLAIN = /^(-?)(\d{1,14})(?:\.(\d{1,12}))?$/u;
const LARGEST = Number.MAX_SAFE_INTEGER;

/**
 * The same as readSi without its key, and quick for plain decimals: numerator and denominator are whole numbers
 * below 2⁵³, so that their quotient is rounded once, exactly as the fraction would be. Anything else goes the
 * exact way.
 *
 * @example readValue({ text: '46.4', unit: '1' }) // => readValue({ text: '46.40', unit: '1' })
 */
export function readValue(reading: Reading): ReadValue {
  const parsed = parseUnit(reading.unit);
  if (parsed.ok && parsed.unit.offset === undefined) {
    const value = quickValue(reading.text, parsed.unit);
    const u = reading.u === undefined ? null : quickValue(reading.u, parsed.unit);
    if (value !== undefined && u !== undefined && (u === null || u > 0))
      return { ok: true, value, u, unit: parsed.unit };
  }
  return readSi(reading);
}

function quickValue(text: string, unit: Unit): number | undefined {
  const match = PLAIN.exec(text);
  if (match === null) return undefined;
  const [, sign = '', whole = '', part = ''] = match;
  const numerator = Number(whole + part) * Number(unit.factor.n);
  const denominator = 10 ** part.length * Number(unit.factor.d);
  if (numerator > LARGEST || denominator > LARGEST) return undefined;
  const value = (numerator / denominator) * (unit.piPower === 0 ? 1 : Math.PI ** unit.piPower);
  return sign === '-' ? -value : value;
}
