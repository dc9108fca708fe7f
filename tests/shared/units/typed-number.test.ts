import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { parseTypedNumber } from '#shared/units/typed-number.ts';

/** No-break spaces as plain ones, for reading. */
const plain = (text: string): string => text.replaceAll('\u00A0', ' ');

describe('typed number', () => {
  test.each([
    ['44.7', { text: '44.7', unit: 'cm' }, '44.7 cm'],
    ['44,7', { text: '44.7', unit: 'cm' }, '44.7 cm'],
    ['44.7 0.4', { text: '44.7', unit: 'cm', u: '0.4' }, '44.7 ± 0.4 cm'],
    ['44,7 0,4', { text: '44.7', unit: 'cm', u: '0.4' }, '44.7 ± 0.4 cm'],
    ['44.7±0.4', { text: '44.7', unit: 'cm', u: '0.4' }, '44.7 ± 0.4 cm'],
    ['44.7+-0.4', { text: '44.7', unit: 'cm', u: '0.4' }, '44.7 ± 0.4 cm'],
    ['44.7 +/- 0.4', { text: '44.7', unit: 'cm', u: '0.4' }, '44.7 ± 0.4 cm'],
    ['44.7(4)', { text: '44.7', unit: 'cm', u: '0.4' }, '44.7 ± 0.4 cm'],
    ['44.70(4)', { text: '44.70', unit: 'cm', u: '0.04' }, '44.70 ± 0.04 cm'],
    ['44.7(12)', { text: '44.7', unit: 'cm', u: '1.2' }, '44.7 ± 1.2 cm'],
    ['44.7(0.4)', { text: '44.7', unit: 'cm', u: '0.4' }, '44.7 ± 0.4 cm'],
    ['447(4) mm', { text: '447', unit: 'mm', u: '4' }, '447 ± 4 mm'],
    ['447 mm', { text: '447', unit: 'mm' }, '447 mm'],
    ['447mm', { text: '447', unit: 'mm' }, '447 mm'],
    ['44.7 ± 0.4 cm', { text: '44.7', unit: 'cm', u: '0.4' }, '44.7 ± 0.4 cm'],
    ['44.7 mm ± 0.4', { text: '44.7', unit: 'mm', u: '0.4' }, '44.7 ± 0.4 mm'],
    ['(44.7 ± 0.4) cm', { text: '44.7', unit: 'cm', u: '0.4' }, '44.7 ± 0.4 cm'],
    ['-3', { text: '-3', unit: 'cm' }, '−3 cm'],
    ['−3', { text: '-3', unit: 'cm' }, '−3 cm'],
    ['1.2e-3', { text: '1.2e-3', unit: 'cm' }, '0.0012 cm'],
    ['1.2·10⁻³ m', { text: '1.2e-3', unit: 'm' }, '0.0012 m'],
    ['1.2 × 10^-20', { text: '1.2e-20', unit: 'cm' }, '1.2 × 10⁻²⁰ cm'],
    ['4.47(4)e-1 m', { text: '4.47e-1', unit: 'm', u: '0.004' }, '0.447 ± 0.004 m'],
    ['10\u202F000', { text: '10000', unit: 'cm' }, '10000 cm'],
    ['.5', { text: '0.5', unit: 'cm' }, '0.5 cm'],
  ])('%s: is understood', (typed, reading, understood) => {
    const result = parseTypedNumber(typed, 'cm');

    expect(result.ok && result.reading).toEqual(reading);
    expect(result.ok && plain(result.understood)).toBe(understood);
  });

  test.each([
    ['', 'empty', 'Write a number, such as 44.7.', null],
    ['abc', 'not a number', '“abc” is not a number. Write it like 44.7, 44.7 ± 0.4 or 447 mm.', null],
    ['NaN', 'not a number', '“NaN” is not a number. Write it like 44.7, 44.7 ± 0.4 or 447 mm.', null],
    ['1,234.5', 'not a number', '“1,234.5” has both decimal marks. Write 1234.5 if that is meant.', '1234.5'],
    ['1.234,5', 'not a number', '“1.234,5” has both decimal marks. Write 1234.5 if that is meant.', '1234.5'],
    [
      '1.234.567',
      'not a number',
      '“1.234.567” has more than one decimal mark. Write 1234567 if that is meant.',
      '1234567',
    ],
    [
      '10 000',
      'ambiguous text',
      '“10 000” may be one number or a value with its uncertainty. Write 10000 or 10 ± 000.',
      '10000',
    ],
    [
      '44.7 ± 1 %',
      'ambiguous text',
      'Write the uncertainty in the unit of the value: 44.7 ± 0.447.',
      '44.7 ± 0.447',
    ],
    [
      '44.7 cm ± 4 mm',
      'ambiguous text',
      'cm and mm stand in one number. Write value and uncertainty in one unit.',
      null,
    ],
    ['3 s', 'dimension mismatch', '3 s is a time; this takes a length in cm.', '3'],
    ['3 sec', 'unknown unit', 'There is no unit “sec”. Did you mean s?', '3 s'],
    [
      '44.7 0',
      'uncertainty not positive',
      'An uncertainty must be more than 0. Leave it out where none is known.',
      '44.7',
    ],
    [
      '44.7 ± -1',
      'uncertainty not positive',
      'An uncertainty must be more than 0. Leave it out where none is known.',
      '44.7',
    ],
    ['1e999', 'not finite', '1e999 is out of the range of numbers.', null],
    ['1 2 3', 'not a number', '“1 2 3” is not a number. Write it like 44.7, 44.7 ± 0.4 or 447 mm.', '1'],
    [
      'Infinity',
      'not a number',
      '“Infinity” is not a number. Write it like 44.7, 44.7 ± 0.4 or 447 mm.',
      null,
    ],
  ])('“%s”: is refused, with a mend where one is likely', (typed, code, sentence, mend) => {
    expect(parseTypedNumber(typed, 'cm')).toEqual({ ok: false, code, sentence, mend });
  });

  test('a unit, in a field of pure numbers: is refused', () => {
    const result = parseTypedNumber('3 cm', '1');

    expect(result).toMatchObject({ ok: false, sentence: '3 cm is a length; this takes a pure number.' });
  });

  test('38° in a field of °: keeps the sign at the number', () => {
    expect(parseTypedNumber('38', '°')).toMatchObject({
      understood: '38°',
      reading: { text: '38', unit: '°' },
    });
  });

  test('law: what was understood is understood the same again', () => {
    const numbers = fc.tuple(
      fc.integer({ min: -99999, max: 99999 }),
      fc.integer({ min: 0, max: 4 }),
      fc.nat(999),
    );

    fc.assert(
      fc.property(numbers, ([digits, places, last]) => {
        const text = (digits / 10 ** places).toFixed(places);
        const first = parseTypedNumber(`${text}(${last + 1})`, 'cm');
        const again = first.ok ? parseTypedNumber(first.understood, 'cm') : first;

        expect(first.ok).toBe(true);
        expect(again).toEqual(first);
      }),
    );
  });
});
