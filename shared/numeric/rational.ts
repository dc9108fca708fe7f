import type { Decimal } from './decimal.ts';

/** An exact fraction n/d in lowest terms with d > 0. Make it with `rational`, never by hand. */
export interface Rational {
  readonly n: bigint;
  readonly d: bigint;
}

/**
 * The fraction n/d in lowest terms.
 *
 * @throws RangeError when d is 0
 * @example rational(6n, -4n).n // => -3n
 */
export function rational(n: bigint, d = 1n): Rational {
  if (d === 0n) throw new RangeError('rational: needs a denominator other than 0');
  const divisor = greatestCommonDivisor(n < 0n ? -n : n, d < 0n ? -d : d);
  const sign = d < 0n ? -1n : 1n;
  return { n: (sign * n) / divisor, d: (sign * d) / divisor };
}

/** Nought, so that it need not be made again. */
export const RATIONAL_ZERO: Rational = { n: 0n, d: 1n };
/** One, likewise. */
export const RATIONAL_ONE: Rational = { n: 1n, d: 1n };

/**
 * Exact sum.
 *
 * @example formatRational(addRational({ n: 1n, d: 2n }, { n: 1n, d: 3n })) // => '5/6'
 */
export function addRational(a: Rational, b: Rational): Rational {
  if (a.n === 0n) return b;
  if (b.n === 0n) return a;
  return rational(a.n * b.d + b.n * a.d, a.d * b.d);
}

/**
 * Exact difference a − b.
 *
 * @example formatRational(subtractRational({ n: 1n, d: 2n }, { n: 1n, d: 2n })) // => '0'
 */
export function subtractRational(a: Rational, b: Rational): Rational {
  return addRational(a, { n: -b.n, d: b.d });
}

/**
 * Exact product.
 *
 * @example formatRational(multiplyRational({ n: 2n, d: 3n }, { n: 3n, d: 4n })) // => '1/2'
 */
export function multiplyRational(a: Rational, b: Rational): Rational {
  return rational(a.n * b.n, a.d * b.d);
}

/**
 * Exact quotient a/b.
 *
 * @throws RangeError when b is 0
 * @example formatRational(divideRational({ n: 1n, d: 2n }, { n: 1n, d: 4n })) // => '2'
 */
export function divideRational(a: Rational, b: Rational): Rational {
  return rational(a.n * b.d, a.d * b.n);
}

/**
 * Exact whole power; a negative exponent inverts.
 *
 * @param exponent - a whole number
 * @throws RangeError when 0 is raised to a negative power
 * @example formatRational(powerRational({ n: 1n, d: 100n }, -2)) // => '10000'
 */
export function powerRational(base: Rational, exponent: number): Rational {
  const power = BigInt(Math.abs(exponent));
  return exponent < 0
    ? rational(base.d ** power, base.n ** power)
    : rational(base.n ** power, base.d ** power);
}

/**
 * Whether two fractions are one and the same number.
 *
 * @example equalRational({ n: 1n, d: 2n }, { n: 1n, d: 2n }) // => true
 */
export function equalRational(a: Rational, b: Rational): boolean {
  return a.n === b.n && a.d === b.d;
}

/**
 * The fraction of a decimal, exactly.
 *
 * @example formatRational(decimalToRational({ digits: 250n, scale: 2 })) // => '5/2'
 */
export function decimalToRational(decimal: Decimal): Rational {
  return decimal.scale >= 0
    ? rational(decimal.digits, 10n ** BigInt(decimal.scale))
    : rational(decimal.digits * 10n ** BigInt(-decimal.scale));
}

/**
 * The fraction that a finite double stands for, exactly (its denominator is a power of two).
 *
 * @throws RangeError when the value is not finite
 * @example formatRational(numberToRational(0.375)) // => '3/8'
 */
export function numberToRational(value: number): Rational {
  if (!Number.isFinite(value)) throw new RangeError(`numberToRational: needs a finite number, got ${value}`);
  let mantissa = value;
  let doublings = 0n;
  while (!Number.isInteger(mantissa)) {
    mantissa *= 2;
    doublings += 1n;
  }
  return rational(BigInt(mantissa), 1n << doublings);
}

/**
 * The double nearest to the fraction (ties to even; below 1e-290 it may be one unit in the last place off).
 *
 * @example rationalToNumber({ n: 464n, d: 1000n }) // => 0.464
 */
export function rationalToNumber(value: Rational): number {
  const negative = value.n < 0n;
  const n = negative ? -value.n : value.n;
  if (n === 0n) return 0;
  // 66 bits of quotient and one sticky bit decide every rounding of a 53-bit result.
  const shift = 66 - (bitLength(n) - bitLength(value.d));
  const scaled = shift >= 0 ? n << BigInt(shift) : n;
  const divisor = shift >= 0 ? value.d : value.d << BigInt(-shift);
  const quotient = scaled / divisor;
  const sticky = scaled % divisor === 0n ? 0n : 1n;
  const magnitude = scaleByPowerOfTwo(Number((quotient << 1n) | sticky), -shift - 1);
  return negative ? -magnitude : magnitude;
}

/**
 * `3`, `-1/2`.
 *
 * @example formatRational({ n: -1n, d: 2n }) // => '-1/2'
 */
export function formatRational(value: Rational): string {
  return value.d === 1n ? String(value.n) : `${value.n}/${value.d}`;
}

function scaleByPowerOfTwo(value: number, exponent: number): number {
  // 2^exponent alone may leave the range of doubles although the product does not.
  const half = Math.trunc(exponent / 2);
  return value * 2 ** half * 2 ** (exponent - half);
}

function bitLength(value: bigint): number {
  return value.toString(2).length;
}

function greatestCommonDivisor(a: bigint, b: bigint): bigint {
  while (b !== 0n) [a, b] = [b, a % b];
  return a === 0n ? 1n : a;
}
