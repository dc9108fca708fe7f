/**
 * A number carried as the unevaluated sum of two doubles, |lo| ≤ half a unit in the last place of hi:
 * about 32 significant digits. Sums and products of readings in this form keep the decimals as they were typed.
 */
export interface DoubleDouble {
  readonly hi: number;
  readonly lo: number;
}

/** Zero, exactly. */
export const ZERO: DoubleDouble = { hi: 0, lo: 0 };
/** One, exactly. */
export const ONE: DoubleDouble = { hi: 1, lo: 0 };

/**
 * A double as a double-double, exactly.
 *
 * @example fromNumber(2.5).hi // => 2.5
 */
export function fromNumber(value: number): DoubleDouble {
  return { hi: value, lo: 0 };
}

/**
 * The nearest double.
 *
 * @example toNumber({ hi: 2, lo: 1e-20 }) // => 2
 */
export function toNumber(value: DoubleDouble): number {
  return value.hi + value.lo;
}

/** Sum of hi and lo where |hi| ≥ |lo|, exactly (fast two-sum). */
function renormalised(hi: number, lo: number): DoubleDouble {
  const sum = hi + lo;
  return { hi: sum, lo: lo - (sum - hi) };
}

/**
 * a + b without any rounding error.
 *
 * Source: D. E. Knuth, The Art of Computer Programming vol. 2, 3rd ed., section 4.2.2, theorem B.
 *
 * @example twoSum(1e17, 1).lo // => 1
 */
export function twoSum(a: number, b: number): DoubleDouble {
  const sum = a + b;
  const shadow = sum - a;
  return { hi: sum, lo: a - (sum - shadow) + (b - shadow) };
}

/** 2^27 + 1: multiplying by it splits a double into two halves of 26 bits (Dekker). */
const SPLITTER = 134217729;

/**
 * a · b without any rounding error, for |a|, |b| < 1e300 and products above 1e-290.
 *
 * Source: T. J. Dekker, Numerische Mathematik 18, 224 (1971), section 5.
 *
 * @example twoProduct(134217729, 134217729).lo // => 1
 */
export function twoProduct(a: number, b: number): DoubleDouble {
  const product = a * b;
  const aScaled = SPLITTER * a;
  const aHigh = aScaled - (aScaled - a);
  const aLow = a - aHigh;
  const bScaled = SPLITTER * b;
  const bHigh = bScaled - (bScaled - b);
  const bLow = b - bHigh;
  return { hi: product, lo: aHigh * bHigh - product + aHigh * bLow + aLow * bHigh + aLow * bLow };
}

/**
 * Sum, to about 2⁻¹⁰⁴ relative also when the terms nearly cancel.
 *
 * @example toNumber(add({ hi: 1, lo: 1e-20 }, { hi: -1, lo: 0 })) // => 1e-20
 */
export function add(a: DoubleDouble, b: DoubleDouble): DoubleDouble {
  const high = twoSum(a.hi, b.hi);
  const low = twoSum(a.lo, b.lo);
  const first = renormalised(high.hi, high.lo + low.hi);
  return renormalised(first.hi, first.lo + low.lo);
}

/**
 * The same number with the other sign.
 *
 * @example negate({ hi: 1, lo: 0 }).hi // => -1
 */
export function negate(value: DoubleDouble): DoubleDouble {
  return { hi: -value.hi, lo: -value.lo };
}

/**
 * Difference a − b.
 *
 * @example toNumber(subtract({ hi: 3, lo: 0 }, { hi: 1, lo: 0 })) // => 2
 */
export function subtract(a: DoubleDouble, b: DoubleDouble): DoubleDouble {
  return add(a, negate(b));
}

/**
 * Product, to about 2⁻¹⁰² relative.
 *
 * @example toNumber(multiply({ hi: 3, lo: 0 }, { hi: 0.5, lo: 0 })) // => 1.5
 */
export function multiply(a: DoubleDouble, b: DoubleDouble): DoubleDouble {
  const product = twoProduct(a.hi, b.hi);
  return renormalised(product.hi, product.lo + (a.hi * b.lo + a.lo * b.hi));
}

/**
 * Quotient by long division with three partial quotients, to about 2⁻¹⁰⁰ relative. Division by zero gives NaN.
 *
 * @example toNumber(divide({ hi: 3, lo: 0 }, { hi: 2, lo: 0 })) // => 1.5
 */
export function divide(a: DoubleDouble, b: DoubleDouble): DoubleDouble {
  const first = a.hi / b.hi;
  const afterFirst = subtract(a, multiply(fromNumber(first), b));
  const second = afterFirst.hi / b.hi;
  const afterSecond = subtract(afterFirst, multiply(fromNumber(second), b));
  const third = afterSecond.hi / b.hi;
  return add(renormalised(first, second), fromNumber(third));
}

/**
 * Square root, to about 2⁻¹⁰⁰ relative; NaN for a negative number.
 *
 * Method: one Newton step for 1/√a from the double-precision value, the residual taken exactly.
 *
 * @example toNumber(squareRoot({ hi: 9, lo: 0 })) // => 3
 */
export function squareRoot(value: DoubleDouble): DoubleDouble {
  if (value.hi === 0) return ZERO;
  const inverse = 1 / Math.sqrt(value.hi);
  const root = value.hi * inverse;
  const residual = subtract(value, twoProduct(root, root));
  return add(fromNumber(root), fromNumber(residual.hi * inverse * 0.5));
}
