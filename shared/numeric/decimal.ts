/**
 * An exact decimal number: `digits × 10^(−scale)`. Trailing zeros count, so 44.70 keeps its scale of 2.
 *
 * @example parseDecimal('44.70')?.scale // => 2
 */
export interface Decimal {
  readonly digits: bigint;
  readonly scale: number;
}

/** How a decimal is rounded: ties to the even digit, or always toward −∞ (`down`) or +∞ (`up`). */
export type Rounding = 'half-even' | 'down' | 'up';

const DECIMAL_FORM = /^([+\-−]?)(\d*)(?:[.,](\d*))?(?:[eE]([+\-−]?\d{1,4}))?$/u;

/**
 * Reads a number exactly as it is written: sign, digits, one decimal mark (point or comma), exponent of ten.
 *
 * @param text - without spaces, unit or digit groups
 * @returns null when the text is anything else (two marks, letters, nothing)
 * @example parseDecimal('−4,47e1')?.digits // => -447n
 * @example parseDecimal('1,234.5') // => null
 */
export function parseDecimal(text: string): Decimal | null {
  const match = DECIMAL_FORM.exec(text.trim());
  if (match === null) return null;
  const [, sign = '', whole = '', part = '', exponent = '0'] = match;
  if (whole === '' && part === '') return null;
  const magnitude = BigInt(whole + part);
  const scale = part.length - Number(exponent.replace('−', '-'));
  const digits = sign === '-' || sign === '−' ? -magnitude : magnitude;
  return scale < 0 ? { digits: digits * powerOfTen(-scale), scale: 0 } : { digits, scale };
}

/**
 * The decimal that a double stands for, exactly, or rounded to some significant digits first.
 *
 * @param value - finite
 * @param significantDigits - 1 to 21; absent: the shortest text that names this double
 * @throws RangeError when the value is not finite
 * @example decimalToText(numberToDecimal(0.1)) // => '0.1'
 * @example decimalToText(numberToDecimal(46.400000000000006, 13)) // => '46.40000000000'
 */
export function numberToDecimal(value: number, significantDigits?: number): Decimal {
  const text = significantDigits === undefined ? String(value) : value.toPrecision(significantDigits);
  const decimal = Number.isFinite(value) ? parseDecimal(text) : null;
  if (decimal === null) throw new RangeError(`numberToDecimal: needs a finite number, got ${value}`);
  return decimal;
}

/**
 * A text that is equal for equal values however they were written: 44.7, 44.70 and 4.47e1 share one.
 *
 * @example decimalKey({ digits: 4470n, scale: 2 }) // => '447e-1'
 * @example decimalKey({ digits: 0n, scale: 3 }) // => '0'
 */
export function decimalKey(decimal: Decimal): string {
  let { digits, scale } = decimal;
  if (digits === 0n) return '0';
  while (digits % 10n === 0n) {
    digits /= 10n;
    scale -= 1;
  }
  return scale === 0 ? String(digits) : `${digits}e${-scale}`;
}

/**
 * The double nearest to the decimal.
 *
 * @example decimalToNumber({ digits: 447n, scale: 1 }) // => 44.7
 */
export function decimalToNumber(decimal: Decimal): number {
  return Number(`${decimal.digits}e${-decimal.scale}`);
}

/**
 * The decimal as an unevaluated sum of two doubles, good to about 32 digits.
 *
 * @returns `hi` is the nearest double, `lo` the nearest double of what is left
 * @example decimalToDoubleDouble({ digits: 1n, scale: 1 }).lo // => -5.551115123125783e-18
 */
export function decimalToDoubleDouble(decimal: Decimal): { readonly hi: number; readonly lo: number } {
  const hi = decimalToNumber(decimal);
  if (!Number.isFinite(hi)) return { hi, lo: 0 };
  return { hi, lo: decimalToNumber(subtractDecimals(decimal, exactDecimal(hi))) };
}

/**
 * Plain digits with a point, all places of the scale kept, ASCII minus, no exponent.
 *
 * @example decimalToText({ digits: -4470n, scale: 2 }) // => '-44.70'
 */
export function decimalToText(decimal: Decimal): string {
  const { digits, scale } = decimal;
  const sign = digits < 0n ? '-' : '';
  const magnitude = String(digits < 0n ? -digits : digits);
  if (scale <= 0) return sign + magnitude + '0'.repeat(-scale);
  const padded = magnitude.padStart(scale + 1, '0');
  return `${sign}${padded.slice(0, -scale)}.${padded.slice(-scale)}`;
}

/**
 * Rounds to a number of decimal places; the result has exactly that scale.
 *
 * @param places - decimal places kept; negative rounds to tens, hundreds, …
 * @example decimalToText(roundDecimal({ digits: 2345n, scale: 3 }, 2)) // => '2.34'
 * @example decimalToText(roundDecimal({ digits: 2341n, scale: 3 }, 2, 'up')) // => '2.35'
 */
export function roundDecimal(decimal: Decimal, places: number, rounding: Rounding = 'half-even'): Decimal {
  const drop = decimal.scale - places;
  if (drop <= 0) return { digits: decimal.digits * powerOfTen(-drop), scale: places };
  const unit = powerOfTen(drop);
  // Floor division, so that the rest is never negative.
  const rest = ((decimal.digits % unit) + unit) % unit;
  const floor = (decimal.digits - rest) / unit;
  return { digits: floor + (roundsUp(rest, unit, floor, rounding) ? 1n : 0n), scale: places };
}

/**
 * Exact sum.
 *
 * @example decimalToText(addDecimals({ digits: 1n, scale: 1 }, { digits: 2n, scale: 1 })) // => '0.3'
 */
export function addDecimals(a: Decimal, b: Decimal): Decimal {
  const scale = Math.max(a.scale, b.scale);
  return { digits: digitsAtScale(a, scale) + digitsAtScale(b, scale), scale };
}

/**
 * Exact difference a − b.
 *
 * @example decimalToText(subtractDecimals({ digits: 464n, scale: 1 }, { digits: 4794n, scale: 2 })) // => '-1.54'
 */
export function subtractDecimals(a: Decimal, b: Decimal): Decimal {
  return addDecimals(a, { digits: -b.digits, scale: b.scale });
}

/**
 * −1, 0 or 1 as a is below, equal to or above b.
 *
 * @example compareDecimals({ digits: 447n, scale: 1 }, { digits: 4470n, scale: 2 }) // => 0
 */
export function compareDecimals(a: Decimal, b: Decimal): -1 | 0 | 1 {
  const { digits } = subtractDecimals(a, b);
  return digits < 0n ? -1 : digits > 0n ? 1 : 0;
}

function roundsUp(rest: bigint, unit: bigint, floor: bigint, rounding: Rounding): boolean {
  if (rest === 0n || rounding === 'down') return false;
  if (rounding === 'up') return true;
  const twice = 2n * rest;
  return twice > unit || (twice === unit && floor % 2n !== 0n);
}

/** A finite double is m·2^e, and for e < 0 that is m·5^(−e)·10^e: always a finite decimal. */
function exactDecimal(value: number): Decimal {
  let mantissa = value;
  let exponent = 0;
  while (!Number.isInteger(mantissa)) {
    mantissa *= 2;
    exponent += 1;
  }
  return { digits: BigInt(mantissa) * 5n ** BigInt(exponent), scale: exponent };
}

function digitsAtScale(decimal: Decimal, scale: number): bigint {
  return decimal.digits * powerOfTen(scale - decimal.scale);
}

function powerOfTen(exponent: number): bigint {
  return 10n ** BigInt(exponent);
}
