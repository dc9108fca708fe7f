import { decimalToNumber, parseDecimal, type Decimal } from '#shared/numeric/decimal.ts';
import {
  addRational,
  decimalToRational,
  formatRational,
  multiplyRational,
  rationalToNumber,
  RATIONAL_ZERO,
} from '#shared/numeric/rational.ts';
import type { Dimension } from './dimension.ts';
import { parseUnit } from './parse-unit.ts';
import type { Unit } from './unit.ts';

/** A number as it was typed, with its unit and, where given, its own standard uncertainty in that unit. */
export interface TypedReading {
  readonly text: string;
  readonly unit: string;
  readonly u?: string | undefined;
}

/** What readSi gives: the value in SI, or what is wrong with which part of the reading. */
export type SiReading =
  | {
      readonly ok: true;
      /** In coherent SI, the double nearest to the exact value (to a few units in the last place for °). */
      readonly value: number;
      /** The typed standard uncertainty in SI; null when none was typed. */
      readonly u: number | null;
      /** Equal exactly for readings that are the same decimal after conversion: 20 cm and 200.0 mm. */
      readonly key: string;
      readonly dimension: Dimension;
      readonly unit: Unit;
    }
  | {
      readonly ok: false;
      readonly code:
        | 'not a number'
        | 'not finite'
        | 'unknown unit'
        | 'ambiguous text'
        | 'syntax'
        | 'uncertainty not positive';
      readonly sentence: string;
      readonly field: 'text' | 'unit' | 'u';
    };

/**
 * Turns a reading into coherent SI by the exact factor of its unit, with one rounding at the end.
 *
 * @example readSi({ text: '46.4', unit: 'cm' }).value // => 0.464
 * @example readSi({ text: '200.0', unit: 'mm' }).key === readSi({ text: '20', unit: 'cm' }).key // => true
 */
export function readSi(reading: TypedReading): SiReading {
  const parsed = parseUnit(reading.unit);
  if (!parsed.ok) return { ok: false, code: parsed.code, sentence: parsed.sentence, field: 'unit' };
  const decimal = parseDecimal(reading.text);
  if (decimal === null) return notANumber(reading.text);
  if (!Number.isFinite(decimalToNumber(decimal)) || Math.abs(decimal.scale) > MAX_SCALE)
    return notFinite(reading.text);
  const { unit } = parsed;
  const exact = addRational(
    multiplyRational(decimalToRational(decimal), unit.factor),
    unit.offset ?? RATIONAL_ZERO,
  );
  const u = reading.u === undefined ? null : readUncertainty(reading.u, unit);
  if (u !== null && typeof u !== 'number') return u;
  const value = rationalToNumber(exact) * Math.PI ** unit.piPower;
  if (!Number.isFinite(value)) return notFinite(reading.text);
  const pi = exact.n === 0n || unit.piPower === 0 ? '' : `π^${unit.piPower}`;
  return { ok: true, value, u, key: formatRational(exact) + pi, dimension: unit.dimension, unit };
}

/** Beyond it a double is 0 or infinite. */
const MAX_SCALE = 400;

function readUncertainty(text: string, unit: Unit): number | Extract<SiReading, { ok: false }> {
  const decimal = parseDecimal(text);
  if (decimal === null || !isUsable(decimal)) {
    return {
      ok: false,
      code: 'not a number',
      sentence: `“${text}” is not a number. Write its u like 0.4.`,
      field: 'u',
    };
  }
  if (decimal.digits <= 0n) {
    return {
      ok: false,
      code: 'uncertainty not positive',
      sentence: `An uncertainty must be more than 0, not ${text}. Leave it out where none is known.`,
      field: 'u',
    };
  }
  const exact = multiplyRational(decimalToRational(decimal), unit.factor);
  return rationalToNumber(exact) * Math.PI ** unit.piPower;
}

function isUsable(decimal: Decimal): boolean {
  return Number.isFinite(decimalToNumber(decimal)) && Math.abs(decimal.scale) <= MAX_SCALE;
}

function notANumber(text: string): SiReading {
  const sentence =
    /[.,].*[.,]/u.test(text) && /^[\d.,\s+\-−]+$/u.test(text)
      ? `“${text}” has more than one decimal mark. Write it with one point.`
      : `“${text}” is not a number. Write figures such as 44.7.`;
  return { ok: false, code: 'not a number', sentence, field: 'text' };
}

function notFinite(text: string): SiReading {
  return {
    ok: false,
    code: 'not finite',
    sentence: `“${text}” is too large to compute with.`,
    field: 'text',
  };
}
