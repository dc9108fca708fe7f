import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  addDecimals,
  compareDecimals,
  decimalKey,
  decimalToDoubleDouble,
  decimalToNumber,
  decimalToText,
  numberToDecimal,
  parseDecimal,
  roundDecimal,
  subtractDecimals,
  type Decimal,
} from '#shared/numeric/decimal.ts';
import {
  addRational,
  divideRational,
  multiplyRational,
  numberToRational,
  powerRational,
  rational,
  rationalToNumber,
} from '#shared/numeric/rational.ts';

const decimals = fc.record({
  digits: fc.bigInt(-(10n ** 18n), 10n ** 18n),
  scale: fc.integer({ min: 0, max: 20 }),
});
const rationals = fc
  .tuple(fc.bigInt(-(10n ** 9n), 10n ** 9n), fc.bigInt(1n, 10n ** 9n))
  .map(([n, d]) => rational(n, d));

function read(text: string): Decimal {
  const decimal = parseDecimal(text);
  if (decimal === null) throw new Error(`no decimal: ${text}`);
  return decimal;
}

describe('parse decimal', () => {
  test.each([
    ['44.7', 447n, 1],
    ['44,70', 4470n, 2],
    ['-3', -3n, 0],
    ['−3', -3n, 0],
    ['+.5', 5n, 1],
    ['5.', 5n, 0],
    ['1.25e-3', 125n, 5],
    ['1.25E3', 1250n, 0],
    [' 12 ', 12n, 0],
  ])('%s, when a number: keeps every digit', (text, digits, scale) => {
    expect(parseDecimal(text)).toEqual({ digits, scale });
  });

  test.each(['', '.', '1,234.5', '1.2.3', 'abc', '1e', '0x10', 'NaN', 'Infinity', '1e99999', '1 2'])(
    '“%s”, when no number: is refused',
    (text) => {
      expect(parseDecimal(text)).toBeNull();
    },
  );

  test('decimalKey, for one value written in several ways: is one text', () => {
    const keys = ['44.7', '44.70', '447e-1', '4.47E1', '0044.7'].map((text) => decimalKey(read(text)));

    expect(new Set(keys).size).toBe(1);
  });

  test('decimalToDoubleDouble, for 0.1: holds what the double leaves out', () => {
    // 0.1 = 0x1.999999999999ap-4 − 5.551115123125783e-18 (exact binary expansion of 0.1); doubles near 1e12 lie 1/8192 apart
    expect(decimalToDoubleDouble(read('0.1'))).toEqual({ hi: 0.1, lo: -5.551115123125783e-18 });
    expect(decimalToDoubleDouble(read('1000000000000.4')).lo).toBe(-0.2 / 8192);
  });
});

describe('round decimal', () => {
  test.each([
    ['2.345', 2, 'half-even', '2.34'],
    ['2.355', 2, 'half-even', '2.36'],
    ['-2.345', 2, 'half-even', '-2.34'],
    ['2.3451', 2, 'half-even', '2.35'],
    ['1234.5', -1, 'half-even', '1230'],
    ['2.341', 2, 'up', '2.35'],
    ['-2.349', 2, 'up', '-2.34'],
    ['2.349', 2, 'down', '2.34'],
    ['-2.341', 2, 'down', '-2.35'],
    ['2.3', 3, 'half-even', '2.300'],
  ] as const)('%s to %i places, %s: is %s', (text, places, rounding, expected) => {
    expect(decimalToText(roundDecimal(read(text), places, rounding))).toBe(expected);
  });

  test('law: rounding never turns the order of two decimals round', () => {
    fc.assert(
      fc.property(decimals, decimals, fc.integer({ min: 0, max: 12 }), (a, b, places) => {
        const order = compareDecimals(a, b);
        const rounded = compareDecimals(roundDecimal(a, places), roundDecimal(b, places));

        expect(rounded === 0 || rounded === order).toBe(true);
      }),
    );
  });

  test('law: (a + b) − b is a', () => {
    fc.assert(
      fc.property(decimals, decimals, (a, b) => {
        expect(compareDecimals(subtractDecimals(addDecimals(a, b), b), a)).toBe(0);
      }),
    );
  });

  test('law: a double survives its decimal', () => {
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }), (x) => {
        expect(decimalToNumber(numberToDecimal(x))).toBe(x === 0 ? 0 : x);
      }),
    );
  });
});

describe('rational', () => {
  test('rational, with a denominator of 0: throws', () => {
    expect(() => rational(1n, 0n)).toThrow(RangeError);
  });

  test('law: a double survives its fraction', () => {
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true, min: 1e-280 }), (x) => {
        expect(rationalToNumber(numberToRational(x))).toBe(x);
      }),
    );
  });

  test('law: conversion rounds as division of doubles does, when both are exact doubles', () => {
    fc.assert(
      fc.property(fc.integer(), fc.integer({ min: 1, max: 2 ** 31 - 1 }), (n, d) => {
        expect(rationalToNumber(rational(BigInt(n), BigInt(d)))).toBe(n === 0 ? 0 : n / d);
      }),
    );
  });

  test('law: a·b/b is a, and a + b − b is a', () => {
    fc.assert(
      fc.property(rationals, rationals, (a, b) => {
        fc.pre(b.n !== 0n);

        expect(divideRational(multiplyRational(a, b), b)).toEqual(a);
        expect(addRational(addRational(a, b), { n: -b.n, d: b.d })).toEqual(a);
      }),
    );
  });

  test('powerRational, with a negative exponent: inverts', () => {
    expect(powerRational(rational(-2n, 3n), -3)).toEqual(rational(-27n, 8n));
  });
});
