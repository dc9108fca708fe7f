import { describe, expect, test } from 'vitest';
import { groupDigits } from '#shared/formatting/digit-groups.ts';
import {
  formatBare,
  formatConcise,
  formatRounded,
  formatScalar,
  formatUncertainty,
  formatValue,
} from '#shared/formatting/format-scalar.ts';
import { roundWithUncertainty } from '#shared/formatting/rounded.ts';
import { scalarToLatex } from '#shared/formatting/scalar-latex.ts';
import { spokenScalar, spokenUnit } from '#shared/formatting/spoken.ts';

/** No-break spaces as plain ones, narrow ones as underscores, for reading. */
const plain = (text: string): string => text.replaceAll('\u00A0', ' ').replaceAll('\u202F', '_');
const range = { value: 0.4637, u: 0.0039 };
const one = 'one or two digits';
const two = 'two digits';

describe('format a scalar', () => {
  test.each([
    [{ value: 0.4637, u: 0.0039 }, 'cm', one, '46.4 ± 0.4 cm'],
    [{ value: 0.4637, u: 0.0039 }, 'cm', two, '46.37 ± 0.39 cm'],
    [{ value: 0.4637, u: 0.0039 }, 'mm', one, '464 ± 4 mm'],
    [{ value: -0.015, u: 0.007 }, 'cm', one, '−1.5 ± 0.7 cm'],
    [{ value: 0.6252, u: 0.0027 }, '1', two, '0.6252 ± 0.0027'],
    [{ value: 0.6632, u: 0.0087 }, '°', one, '38.0 ± 0.5°'],
    [{ value: 295.15, u: 0.1 }, '°C', two, '22.00 ± 0.10 °C'],
    [{ value: 0.05, u: 0.01 }, '%', two, '5.0 ± 1.0 %'],
    [{ value: 9.8125, u: 0.0005 }, 'm/s^2', one, '9.8125 ± 0.0005 m s⁻²'],
    [{ value: 9.817, u: null }, 'm/s^2', two, '9.817 m s⁻²'],
    [{ value: 101325, u: 12 }, 'Pa', two, '101_325 ± 12 Pa'],
    [{ value: 4.7e7, u: 3e5 }, 'S/m', two, '(4.700 ± 0.030) × 10⁷ S m⁻¹'],
    [{ value: 1.23e-8, u: 4e-10 }, 'm', one, '(1.23 ± 0.04) × 10⁻⁸ m'],
    [{ value: 1e7, u: null }, 'Pa', two, '1 × 10⁷ Pa'],
    [{ value: 0, u: null }, 'cm', two, '0 cm'],
    [{ value: NaN, u: 1 }, 'cm', two, 'not a number'],
    [{ value: 1, u: Infinity }, 'cm', two, 'not a number'],
  ] as const)('%j in %s, %s: is %s', (scalar, unit, rule, expected) => {
    expect(plain(formatScalar(scalar, unit, rule))).toBe(expected);
  });

  test('the other forms, of one value: differ in what they show', () => {
    expect(plain(formatConcise(range, 'cm', one))).toBe('46.4(4) cm');
    expect(plain(formatValue(range, 'cm', one))).toBe('46.4 cm');
    expect(plain(formatBare(range, 'cm', one))).toBe('46.4');
    expect(plain(formatUncertainty(range, 'cm', one))).toBe('0.4 cm');
    expect(formatUncertainty({ value: 1, u: null }, 'cm', one)).toBe('unknown');
    expect(plain(formatConcise({ value: 480, u: 30 }, 'm', one))).toBe('480(30) m');
    expect(plain(formatConcise({ value: 1.23e-8, u: 4e-10 }, 'm', one))).toBe('1.23(4) × 10⁻⁸ m');
  });

  test('one more decimal, when asked for: is shown in value and uncertainty', () => {
    expect(plain(formatScalar(range, 'cm', one, 1))).toBe('46.37 ± 0.39 cm');
    expect(plain(formatRounded(roundWithUncertainty(-1.57, 0.7, one, 1), 'cm'))).toBe('−1.57 ± 0.70 cm');
  });

  test('a unit that is none: is the caller’s mistake', () => {
    expect(() => formatScalar(range, 'wibble', one)).toThrow(RangeError);
  });

  // SI Brochure, 9th edition, 5.4.4: groups of three on both sides, none for four figures.
  test.each([
    ['1234', '1234'],
    ['12345', '12_345'],
    ['1234567.1234567', '1_234_567.123_456_7'],
    ['-0.12345', '−0.123_45'],
    ['0.1234', '0.1234'],
  ])('groups of %s: %s', (text, expected) => {
    expect(plain(groupDigits(text))).toBe(expected);
  });
});

describe('a scalar in LaTeX and in words', () => {
  test.each([
    ['value and uncertainty', '46.4\\pm 0.4\\,\\mathrm{cm}'],
    ['concise', '46.4(4)\\,\\mathrm{cm}'],
    ['value', '46.4\\,\\mathrm{cm}'],
    ['figures', '46.4'],
  ] as const)('LaTeX, %s: is %s', (form, expected) => {
    expect(scalarToLatex(range, 'cm', one, form)).toBe(expected);
  });

  test('LaTeX, of large and negative values: keeps sign and power in their places', () => {
    expect(scalarToLatex({ value: -4.7e7, u: 3e5 }, 'S/m', one, 'value and uncertainty')).toBe(
      '({-}4.70\\pm 0.03)\\times 10^{7}\\,\\mathrm{S\\,m^{-1}}',
    );
  });

  test.each([
    [range, 'cm', '46.4 plus or minus 0.4 centimetres'],
    [{ value: -0.015, u: 0.007 }, 'cm', 'minus 1.5 plus or minus 0.7 centimetres'],
    [{ value: 0.01, u: null }, 'cm', '1 centimetre'],
    [{ value: 0.6632, u: 0.0087 }, '°', '38.0 plus or minus 0.5 degrees'],
    [{ value: 0.967, u: 0.006 }, '1', '0.967 plus or minus 0.006'],
    [{ value: 1.23e-8, u: 4e-10 }, 'm', '1.23 plus or minus 0.04, times ten to the minus 8 metres'],
  ])('%j in %s: is spoken as %s', (scalar, unit, expected) => {
    expect(spokenScalar(scalar, unit, one)).toBe(expected);
  });

  test.each([
    ['m/s^2', 'metres per second squared'],
    ['cm^2', 'square centimetres'],
    ['kg/m^3', 'kilograms per cubic metre'],
    ['N m', 'newton metres'],
    ['µm', 'micrometres'],
    ['%', 'percent'],
    ['1', ''],
  ])('%s: is spoken as “%s”', (unit, expected) => {
    expect(spokenUnit(unit, true)).toBe(expected);
  });
});
