import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  add,
  divide,
  fromNumber,
  multiply,
  squareRoot,
  subtract,
  toNumber,
  twoProduct,
  twoSum,
  type DoubleDouble,
} from '#shared/numeric/double-double.ts';
import { doubleDoubleSum } from '#shared/numeric/double-double-sum.ts';

/** Whole numbers that a double holds exactly, so that big integers can be the judge. */
const whole = fc.integer({ min: -(2 ** 31), max: 2 ** 31 }).map((value) => value * 1_048_573);
const part = fc.double({ min: 1e-100, max: 1e100, noNaN: true });
const pair = fc
  .tuple(part, fc.double({ min: -1, max: 1, noNaN: true }))
  .map(([hi, share]) => twoSum(hi, share * hi * 1e-17));

const exactly = ({ hi, lo }: DoubleDouble): bigint => BigInt(hi) + BigInt(lo);

function relativeError(found: DoubleDouble, expected: DoubleDouble): number {
  return Math.abs(toNumber(subtract(found, expected)) / expected.hi);
}

describe('double-double arithmetic', () => {
  test('two-sum loses nothing', () => {
    fc.assert(fc.property(whole, whole, (a, b) => exactly(twoSum(a, b)) === BigInt(a) + BigInt(b)));
  });

  test('two-product loses nothing', () => {
    fc.assert(fc.property(whole, whole, (a, b) => exactly(twoProduct(a, b)) === BigInt(a) * BigInt(b)));
  });

  test('a quotient times its divisor is the dividend to 30 digits', () => {
    fc.assert(fc.property(pair, pair, (a, b) => relativeError(multiply(divide(a, b), b), a) < 1e-30));
  });

  test('a root squared is its square to 30 digits', () => {
    fc.assert(
      fc.property(pair, (a) => {
        const root = squareRoot(a);
        return relativeError(multiply(root, root), a) < 1e-30;
      }),
    );
  });

  test('a sum less one term is the other term', () => {
    fc.assert(
      fc.property(
        pair,
        (a) => relativeError(subtract(add(a, fromNumber(1)), fromNumber(1)), a) < 1e-31 / Math.min(1, a.hi),
      ),
    );
  });

  test('root of zero, taken: is zero; of a negative number: NaN', () => {
    expect(toNumber(squareRoot(fromNumber(0)))).toBe(0);
    expect(toNumber(squareRoot(fromNumber(-1)))).toBeNaN();
  });

  test('thirds, added three times: give 1 to 31 digits', () => {
    const third = divide(fromNumber(1), fromNumber(3));

    const left = subtract(doubleDoubleSum([third, third, third]), fromNumber(1));

    expect(Math.abs(toNumber(left))).toBeLessThan(1e-31);
  });
});
