import { decimalToNumber, decimalToText, parseDecimal, type Decimal } from '#shared/numeric/decimal.ts';
import { formatExponent, sameDimension } from './dimension.ts';
import { rational } from '#shared/numeric/rational.ts';
import { kindOfQuantity } from './kind-of-quantity.ts';
import { parseUnit } from './parse-unit.ts';
import type { TypedReading } from './reading.ts';
import { splitTypedNumber, type TypedParts } from './split-typed-number.ts';
import { unitGap, unitSigns } from './unit-signs.ts';
import type { Unit } from './unit.ts';

/** What parseTypedNumber gives: a reading and what was understood, or what is wrong. */
export type TypedNumber =
  | {
      readonly ok: true;
      readonly reading: TypedReading;
      /** What was understood, to be shown beside the field: `44.7 ± 0.4 cm`. */
      readonly understood: string;
    }
  | {
      readonly ok: false;
      readonly code:
        | 'empty'
        | 'not a number'
        | 'ambiguous text'
        | 'not finite'
        | 'unknown unit'
        | 'syntax'
        | 'dimension mismatch'
        | 'uncertainty not positive';
      readonly sentence: string;
      /** A text to write in its place, where one is likely. */
      readonly mend: string | null;
    };

type Refusal = Extract<TypedNumber, { ok: false }>;

/** Longest text a reading may have. */
const MAX_LENGTH = 40;

/**
 * Understands a number as people type it: `44.7`, `44,7`, `44.7 0.4`, `44.7±0.4`, `44.7+-0.4`, `44.7(4)`, `447 mm`,
 * `1.2e-3`, `1.2·10⁻³`. What can be read in two ways is refused, and a mend proposed.
 *
 * @param text - what stands in the field
 * @param defaultUnit - unit of the field; a typed unit must measure the same kind of quantity
 * @example parseTypedNumber('44,7(4)', 'cm') // => { ok: true, reading: { text: '44.7', unit: 'cm', u: '0.4' }, understood: '44.7\u00A0±\u00A00.4\u00A0cm' }
 * @example parseTypedNumber('1,234.5', 'cm').mend // => '1234.5'
 */
export function parseTypedNumber(text: string, defaultUnit: string): TypedNumber {
  const parts = splitTypedNumber(text);
  if ('sentence' in parts) return { ok: false, ...parts };
  const unit = unitOf(parts, defaultUnit);
  if ('ok' in unit) return unit;
  const value = finiteDecimal(parts.value);
  if (typeof value === 'string') return refuse('not finite', value);
  const u = uncertaintyOf(parts, value);
  if (typeof u === 'object' && u !== null && 'ok' in u) return u;
  const reading = { text: typedText(parts.value, value), unit: unit.text };
  if (reading.text.length > MAX_LENGTH) return refuse('not a number', `Use at most ${MAX_LENGTH} figures.`);
  const shownU = u === null ? '' : `\u00A0±\u00A0${decimalToText(u)}`;
  return {
    ok: true,
    reading: u === null ? reading : { ...reading, u: decimalToText(u) },
    understood: `${shownNumber(reading.text, value)}${shownU}${unitGap(unit)}${unitSigns(unit)}`,
  };
}

function unitOf(parts: TypedParts, defaultUnit: string): Unit | Refusal {
  const expected = parseUnit(defaultUnit);
  if (parts.unit === '')
    return expected.ok ? named(expected.unit, defaultUnit) : refuse(expected.code, expected.sentence);
  const typed = parseUnit(parts.unit);
  if (!typed.ok) {
    const [near] = typed.suggestions;
    return refuse(typed.code, typed.sentence, near === undefined ? null : `${parts.value} ${near}`);
  }
  if (expected.ok && !sameDimension(typed.unit.dimension, expected.unit.dimension)) {
    const kind = kindOfQuantity(typed.unit.dimension);
    const wanted = kindOfQuantity(expected.unit.dimension);
    const is = kind === null ? `is in ${unitSigns(typed.unit)}` : `is ${kind}`;
    const takes =
      defaultUnit === '1' || defaultUnit === ''
        ? 'a pure number'
        : `${wanted ?? 'a value'} in ${defaultUnit}`;
    const sentence = `${parts.value} ${parts.unit} ${is}; this takes ${takes}.`;
    return refuse('dimension mismatch', sentence, parts.value);
  }
  return typed.unit;
}

/** Keeps the unit's text as the register has it, so that nothing seems to have changed. */
function named(unit: Unit, text: string): Unit {
  return { ...unit, text: text === '' ? '1' : text };
}

function uncertaintyOf(parts: TypedParts, value: Decimal): Decimal | null | Refusal {
  if (parts.u === null) return null;
  const u = parts.lastDigits ? lastDigits(parts.u, value) : finiteDecimal(parts.u);
  if (typeof u === 'string') return refuse('not finite', u);
  if (u.digits <= 0n) {
    return refuse(
      'uncertainty not positive',
      'An uncertainty must be more than 0. Leave it out where none is known.',
      parts.value,
    );
  }
  return u;
}

/** `44.7(4)`: the bracket counts in the last decimal place of the value. */
function lastDigits(text: string, value: Decimal): Decimal {
  return { digits: BigInt(text), scale: value.scale };
}

function finiteDecimal(text: string): Decimal | string {
  const decimal = parseDecimal(text);
  const usable =
    decimal !== null && Math.abs(decimal.scale) <= 330 && Number.isFinite(decimalToNumber(decimal));
  return usable ? decimal : `${text} is out of the range of numbers.`;
}

/** Exponents are kept as typed; otherwise plain figures with a point. */
function typedText(text: string, value: Decimal): string {
  return /e/iu.test(text) ? text.replace(',', '.').replace('−', '-') : decimalToText(value);
}

/** Plain figures where they stay short, else with the power of ten as typed. */
function shownNumber(text: string, value: Decimal): string {
  const plain = decimalToText(value);
  const [mantissa = '', exponent = '0'] = text.split('e');
  const raised = formatExponent(rational(BigInt(exponent)));
  return (plain.length <= 14 ? plain : `${mantissa} × 10${raised}`).replace('-', '−');
}

function refuse(code: Refusal['code'], sentence: string, mend: string | null = null): Refusal {
  return { ok: false, code, sentence, mend };
}
