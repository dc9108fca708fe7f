import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { formatDimension, sameDimension } from '#shared/units/dimension.ts';
import { parseUnit } from '#shared/units/parse-unit.ts';
import { UNITS } from '#shared/units/unit-table.ts';
import type { Unit } from '#shared/units/unit.ts';

function unit(text: string): Unit {
  const result = parseUnit(text);
  if (!result.ok) throw new Error(result.sentence);
  return result.unit;
}

function refusal(text: string) {
  const result = parseUnit(text);
  if (result.ok) throw new Error(`${text} was read as ${result.unit.text}`);
  return result;
}

describe('parse unit', () => {
  // Sizes: SI Brochure, 9th edition, tables 2, 4 and 8; rpm as a rotational frequency, ISO 80000-3.
  test.each([
    ['cm', 0.01, 'm'],
    ['mm', 0.001, 'm'],
    ['µm', 1e-6, 'm'],
    ['μm', 1e-6, 'm'],
    ['um', 1e-6, 'm'],
    ['kg', 1, 'kg'],
    ['g', 0.001, 'kg'],
    ['mg', 1e-6, 'kg'],
    ['min', 60, 's'],
    ['h', 3600, 's'],
    ['ms', 0.001, 's'],
    ['L', 0.001, 'm³'],
    ['mL', 1e-6, 'm³'],
    ['rpm', 1 / 60, 's⁻¹'],
    ['ppm', 1e-6, '1'],
    ['%', 0.01, '1'],
    ['Ω', 1, 'kg m² s⁻³ A⁻²'],
    ['kΩ', 1000, 'kg m² s⁻³ A⁻²'],
    ['K', 1, 'K'],
    ['Hz', 1, 's⁻¹'],
    ['N', 1, 'kg m s⁻²'],
    ['Pa', 1, 'kg m⁻¹ s⁻²'],
    ['hPa', 100, 'kg m⁻¹ s⁻²'],
    ['bar', 1e5, 'kg m⁻¹ s⁻²'],
    ['J', 1, 'kg m² s⁻²'],
    ['W', 1, 'kg m² s⁻³'],
    ['V', 1, 'kg m² s⁻³ A⁻¹'],
    ['T', 1, 'kg s⁻² A⁻¹'],
    ['mT', 0.001, 'kg s⁻² A⁻¹'],
    ['C', 1, 's A'],
    ['F', 1, 'kg⁻¹ m⁻² s⁴ A²'],
    ['H', 1, 'kg m² s⁻² A⁻²'],
    ['Wb', 1, 'kg m² s⁻² A⁻¹'],
    ['eV', 1.602176634e-19, 'kg m² s⁻²'],
    ['u', 1.66053906892e-27, 'kg'],
    ['frames', 1, '1'],
    ['fps', 1, 's⁻¹'],
    ['°', Math.PI / 180, 'rad'],
    ['mrad', 0.001, 'rad'],
    ['cd', 1, 'cd'],
    ['m/s^2', 1, 'm s⁻²'],
    ['m·s⁻²', 1, 'm s⁻²'],
    ['m s^-2', 1, 'm s⁻²'],
    ['m/s²', 1, 'm s⁻²'],
    ['m*s^-2', 1, 'm s⁻²'],
    ['km/h', 1 / 3.6, 'm s⁻¹'],
    ['J/(kg K)', 1, 'm² s⁻² K⁻¹'],
    ['J/kg/K', 1, 'm² s⁻² K⁻¹'],
    ['(m/s)^2', 1, 'm² s⁻²'],
    ['cm^(1/2)', 0.1, 'm^(1/2)'],
    ['mm^0.5/s', Math.sqrt(0.001), 'm^(1/2) s⁻¹'],
    ['1/s', 1, 's⁻¹'],
    ['1', 1, '1'],
    ['', 1, '1'],
  ])('%s: is %d × %s', (text, scale, dimension) => {
    const read = unit(text);

    expect(read.scale).toAgreeTo(scale, { digits: 15 });
    expect(formatDimension(read.dimension)).toBe(dimension);
  });

  test('°: is 1/180 of π, exactly', () => {
    expect(unit('°')).toMatchObject({ factor: { n: 1n, d: 180n }, piPower: 1, exact: true });
    expect(unit('°/s')).toMatchObject({ factor: { n: 1n, d: 180n }, piPower: 1 });
  });

  test('dalton: says that its factor is a rounded figure', () => {
    expect(unit('u').exact).toBe(false);
    expect(unit('eV').exact).toBe(true);
  });

  test.each([
    ['sec', 'unknown unit', 'There is no unit “sec”. Did you mean s?', 's'],
    ['cmm', 'unknown unit', 'There is no unit “cmm”. Did you mean mm or cm or cm m?', 'mm'],
    ['Nm', 'unknown unit', 'There is no unit “Nm”. Did you mean N m or nm or mm?', 'N m'],
    ['HZ', 'unknown unit', 'There is no unit “HZ”. Did you mean Hz?', 'Hz'],
    ['m/sec', 'unknown unit', 'There is no unit “sec”. Did you mean s?', 'm/s'],
    ['m2', 'syntax', '“m2” is not a unit. Did you mean m^2?', 'm^2'],
    ['s-2', 'syntax', '“s-2” is not a unit. Did you mean s^-2?', 's^-2'],
    ['J/kg K', 'ambiguous text', '“J/kg K” can be read in two ways. Write J/(kg K) or J K/kg.', 'J/(kg K)'],
    [
      'W/(m^2 °C)',
      'ambiguous text',
      '°C has its own zero and cannot be part of “W/(m^2 °C)”. Write W/(m^2 K).',
      'W/(m^2 K)',
    ],
    ['°C^2', 'ambiguous text', '°C has its own zero and cannot be part of “°C^2”. Write K^2.', 'K^2'],
  ])('%s: is refused with a mend', (text, code, sentence, mend) => {
    const result = refusal(text);

    expect(result.code).toBe(code);
    expect(result.sentence).toBe(sentence);
    expect(result.suggestions[0]).toBe(mend);
  });

  test.each([
    ['wibble', 'There is no unit “wibble”. Write units like cm, m/s^2 or °, and 1 for a pure number.'],
    ['dB', 'dB is the logarithm of a ratio. Enter the ratio itself, with unit 1.'],
    ['m^', '“m^” is not a unit: a power must be a number such as 2, -1 or (1/2).'],
    ['m/', '“m/” is not a unit: something is missing at its end.'],
    ['/s', '“/s” is not a unit: “/” has nothing before it.'],
    ['(m', '“(m” is not a unit: a bracket is not closed.'],
    ['m)', '“m)” is not a unit: a bracket is closed that was not opened.'],
    ['2 m', '“2 m” has a figure in it. Put 2 with the number, and write the unit alone.'],
    ['m+s', '“+” cannot stand in a unit. Write units like cm, m/s^2 or J/(kg K).'],
    ['m^1000', '“m^1000” is not a unit: a power must be a number such as 2, -1 or (1/2).'],
    ['°^(1/2)', '“°^(1/2)” takes a root of a unit that has none. Use whole powers.'],
    ['m'.repeat(80), '“mmmmmmmmmmmmmmmmmmmm…” is too long for a unit.'],
  ])('%s: is refused with a sentence', (text, sentence) => {
    expect(refusal(text).sentence).toBe(sentence);
  });

  test('law: the canonical text is read back as the same unit', () => {
    const signs = UNITS.filter(({ offset }) => offset === undefined).map(({ names }) => names[0]);
    const factor = fc.tuple(fc.constantFrom(...signs), fc.integer({ min: -4, max: 4 }));

    fc.assert(
      fc.property(fc.array(factor, { minLength: 1, maxLength: 4 }), (factors) => {
        const written = factors.map(([sign, power]) => `${sign}^${power}`).join(' ');
        const first = unit(written);
        const again = unit(first.text);

        expect(again.factor).toEqual(first.factor);
        expect(again.piPower).toBe(first.piPower);
        expect(sameDimension(again.dimension, first.dimension)).toBe(true);
      }),
    );
  });
});
