import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { fromSi, toSi, uncertaintyFromSi, uncertaintyToSi } from '#shared/units/convert.ts';
import { parseUnit } from '#shared/units/parse-unit.ts';
import { readSi } from '#shared/units/reading.ts';
import { kindOfQuantity } from '#shared/units/kind-of-quantity.ts';

function read(text: string, unit: string, u?: string) {
  const reading = readSi({ text, unit, u });
  if (!reading.ok) throw new Error(reading.sentence);
  return reading;
}

function unit(text: string) {
  const parsed = parseUnit(text);
  if (!parsed.ok) throw new Error(parsed.sentence);
  return parsed.unit;
}

describe('read a reading', () => {
  test.each([
    ['46.4', 'cm', 0.464],
    ['0.1', 'mm', 0.0001],
    ['12,5', 'g', 0.0125],
    ['-3', '°C', 270.15],
    ['20', '°C', 293.15],
    ['90', 'min', 5400],
    ['180', '°', Math.PI],
    ['38', '°', (38 * Math.PI) / 180],
    ['1.2e-3', 'km', 1.2],
  ])('%s %s: is %d in SI', (text, unitText, expected) => {
    expect(read(text, unitText).value).toAgreeTo(expected, { digits: 15 });
  });

  test('u, in °C: is a difference and keeps out of the zero', () => {
    expect(read('20', '°C', '0.5').u).toBe(0.5);
    expect(read('46.4', 'cm', '0.4').u).toBe(0.004);
  });

  test.each([
    [
      ['20', 'cm'],
      ['200.0', 'mm'],
    ],
    [
      ['38', '°'],
      ['38.00', '°'],
    ],
    [
      ['0', '°'],
      ['0.0', 'rad'],
    ],
    [
      ['20', '°C'],
      ['293.15', 'K'],
    ],
    [
      ['1', 'L'],
      ['1000', 'cm^3'],
    ],
  ])('%j and %j: have one key', ([a = '', unitA = ''], [b = '', unitB = '']) => {
    expect(read(a, unitA).key).toBe(read(b, unitB).key);
  });

  test.each([
    [
      ['20', 'cm'],
      ['20.0000001', 'cm'],
    ],
    [
      ['38', '°'],
      ['0.6632251157578453', 'rad'],
    ],
    [
      ['180', '°'],
      ['1', '1'],
    ],
  ])('%j and %j: have different keys', ([a = '', unitA = ''], [b = '', unitB = '']) => {
    expect(read(a, unitA).key).not.toBe(read(b, unitB).key);
  });

  test.each([
    [
      { text: '1,234.5', unit: 'cm' },
      'not a number',
      'text',
      '“1,234.5” has more than one decimal mark. Write it with one point.',
    ],
    [
      { text: 'abc', unit: 'cm' },
      'not a number',
      'text',
      '“abc” is not a number. Write figures such as 44.7.',
    ],
    [{ text: '1e999', unit: 'cm' }, 'not finite', 'text', '“1e999” is too large to compute with.'],
    [{ text: '1', unit: 'sec' }, 'unknown unit', 'unit', 'There is no unit “sec”. Did you mean s?'],
    [
      { text: '1', unit: 's', u: '0' },
      'uncertainty not positive',
      'u',
      'An uncertainty must be more than 0, not 0. Leave it out where none is known.',
    ],
    [
      { text: '1', unit: 's', u: '-1' },
      'uncertainty not positive',
      'u',
      'An uncertainty must be more than 0, not -1. Leave it out where none is known.',
    ],
    [{ text: '1', unit: 's', u: 'x' }, 'not a number', 'u', '“x” is not a number. Write its u like 0.4.'],
  ])('%j: is refused as %s in %s', (reading, code, field, sentence) => {
    expect(readSi(reading)).toEqual({ ok: false, code, field, sentence });
  });

  test('law: converting to SI and back gives the number again', () => {
    const units = fc.constantFrom(
      'cm',
      'mm',
      'µm',
      'km/h',
      '°',
      'g',
      'min',
      'mL',
      'ppm',
      '°C',
      'eV',
      'rpm',
      'kΩ',
    );
    const values = fc.double({ min: 1e-6, max: 1e6, noNaN: true });

    fc.assert(
      fc.property(units, values, (text, value) => {
        const known = unit(text);
        const error = Math.abs(fromSi(toSi(value, known), known) - value);

        expect(error).toBeLessThanOrEqual(8e-16 * (value + (text === '°C' ? 300 : 0)));
        expect(uncertaintyFromSi(uncertaintyToSi(Math.abs(value), known), known)).toBeCloseTo(
          Math.abs(value),
          8,
        );
      }),
    );
  });

  test('kindOfQuantity: speaks of everyday kinds', () => {
    expect(
      ['cm', 's', 'm/s', 'cm^2', '°', '%', 'kg m^7'].map((text) => kindOfQuantity(unit(text).dimension)),
    ).toEqual(['a length', 'a time', 'a speed', 'an area', 'an angle', 'a pure number', null]);
  });
});
