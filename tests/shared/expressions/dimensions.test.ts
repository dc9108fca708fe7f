import { describe, expect, test } from 'vitest';
import { checkEquation } from '#shared/expressions/check-equation.ts';
import { dimensionOf } from '#shared/expressions/dimension-of.ts';
import { formatDimension, type Dimension } from '#shared/units/dimension.ts';
import { parseUnit } from '#shared/units/parse-unit.ts';
import { expression, symbols } from './problem-symbols.ts';

const UNITS: Readonly<Record<string, string>> = {
  θ: '°',
  h: 'cm',
  H: 'cm',
  R: 'cm',
  y: 'cm',
  C_v: '1',
  m: 'g',
  g: 'm/s^2',
  v: 'm/s',
  t: 's',
  τ: 's',
  ρ: 'kg/m^3',
  T: '°C',
  N: 'frames',
  f: 'fps',
  n: '1',
};
const known = symbols(
  ...Object.keys(UNITS).map((symbol) => (symbol === 'τ' ? 'tau' : symbol === 'ρ' ? 'rho' : symbol)),
);
const unitOf = (id: string): string => {
  const symbol = known.find((each) => each.id === id)?.symbol ?? '';
  return UNITS[{ tau: 'τ', rho: 'ρ' }[symbol] ?? symbol] ?? '1';
};
const dimensionOfInput = (id: string): Dimension => {
  const unit = parseUnit(unitOf(id));
  if (!unit.ok) throw new Error(unit.sentence);
  return unit.unit.dimension;
};

function dimension(text: string): string {
  const result = dimensionOf(expression(text, known), dimensionOfInput, unitOf);
  return result.ok ? formatDimension(result.dimension) : result.fault.sentence;
}

describe('dimension of an expression', () => {
  test.each([
    ['C_v^2*h', 'm'],
    ['H*sin(2θ) + 2*cos(θ)*sqrt(H*(H*sin(θ)^2 + y))', 'm'],
    ['sqrt(2*m*g/(ρ*h^2))', 'm s⁻¹'],
    ['v^2/(2*g)*log(1 + v^2/(g*h))', 'm'],
    ['exp(-t/τ)', '1'],
    ['(m*g)^(1/3)', 'kg^(1/3) m^(1/3) s^(-2/3)'],
    ['cbrt(h^3)', 'm'],
    ['h^-1', 'm⁻¹'],
    ['h^0.5', 'm^(1/2)'],
    ['2.5 mm + h', 'm'],
    ['θ + 38°', 'rad'],
    ['tan(θ) + θ', '1'],
    ['sin(y/h)', '1'],
    ['atan2(y, h)', 'rad'],
    ['hypot(y, h)', 'm'],
    ['max(y, h, 2 [cm])', 'm'],
    ['abs(y)', 'm'],
    ['sign(y)', '1'],
    ['h > y ? h : y', 'm'],
    ['300 < n < 2e5', '1'],
    ['T - 20 °C', 'K'],
    ['h*f/N', 'm s⁻¹'],
    ['C_v^n', '1'],
    ['(h/y)^n', '1'],
  ])('%s: is %s', (text, expected) => {
    expect(dimension(text)).toBe(expected);
  });

  test.each([
    ['h + t', 'Units do not agree in “h + t”. Left side is cm, right side is s.'],
    [
      'H + y^2',
      'Units do not agree in “H + y^2”. Left side is cm, right side is cm². Is a square root missing?',
    ],
    ['H^2 + y', 'Units do not agree in “H^2 + y”. Left side is cm², right side is cm. Is a square missing?'],
    [
      'v + h',
      'Units do not agree in “v + h”. Left side is m s⁻¹, right side is cm. Is a division by a time missing?',
    ],
    [
      'h + v',
      'Units do not agree in “h + v”. Left side is cm, right side is m s⁻¹. Is a multiplication by a time missing?',
    ],
    ['1 + h', 'Units do not agree in “1 + h”. Left side is a pure number, right side is cm.'],
    [
      'H*(H*sin(θ)^2 + y^2)',
      'Units do not agree in “(H*sin(θ)^2 + y^2)”. Left side is cm, right side is cm². Is a square root missing?',
    ],
    [
      'sin(h)',
      'sin needs an angle or a pure number, and “h” is in cm. Divide it by a scale of its own kind first.',
    ],
    ['exp(-t)', 'exp needs a pure number, and “-t” is in s. Divide it by a scale of its own kind first.'],
    ['log(v)', 'log needs a pure number, and “v” is in m s⁻¹. Divide it by a scale of its own kind first.'],
    [
      'h^n',
      '“h” is in cm, so its power must be a number that stands in the formula, like 2 or 1/3. Divide it by a scale of its own kind first.',
    ],
    [
      '2^h',
      'A power needs a pure number as its exponent, and “h” is in cm. Divide it by a scale of its own kind first.',
    ],
    ['h > t', 'Units do not agree in “h > t”. Left side is cm, right side is s.'],
    ['h > y ? h : t', 'Units do not agree in “h > y ? h : t”. Left side is cm, right side is s.'],
    [
      'h ? 1 : 2',
      'A choice needs a comparison before the question mark, and “h” is in cm. Divide it by a scale of its own kind first.',
    ],
    ['max(h, t)', 'Units do not agree in “max(h, t)”. Left side is cm, right side is s.'],
    ['h + 3 s', 'Units do not agree in “h + 3 s”. Left side is cm, right side is s.'],
  ])('%s: says where and how units do not agree', (text, sentence) => {
    expect(dimension(text).replaceAll('\u00A0', ' ')).toBe(sentence);
  });

  test('the place of a mismatch: is the smallest part that has it', () => {
    const parsed = expression('2*R + sqrt(H*(H*sin(θ)^2 + y^2))', known);

    const result = dimensionOf(parsed, dimensionOfInput, unitOf);

    if (result.ok) throw new Error('no mismatch');
    expect(parsed.shown.slice(result.fault.span.from, result.fault.span.to)).toBe('(H*sin(θ)^2 + y^2)');
    expect(result.fault.code).toBe('dimension mismatch');
  });
});

describe('check equation', () => {
  const check = (left: string, text: string): string | null =>
    checkEquation({ left, expression: expression(text, known), dimensionOf: dimensionOfInput, unitOf })
      ?.sentence ?? null;

  test.each([
    ['cm', 'C_v^2*h'],
    ['mm', 'C_v^2*h'],
    ['°', 'atan(sqrt(H/(H + y)))'],
    ['1', 'atan(sqrt(H/(H + y)))'],
    ['rpm', '1/t'],
  ])('%s = %s: agrees', (left, text) => {
    expect(check(left, text)).toBeNull();
  });

  test.each([
    ['cm', 'H*(H + y)', 'Units do not agree. Left side is cm, right side is cm². Is a square root missing?'],
    ['cm^2', 'H + y', 'Units do not agree. Left side is cm², right side is cm. Is a square missing?'],
    [
      'm/s',
      'h',
      'Units do not agree. Left side is m s⁻¹, right side is cm. Is a division by a time missing?',
    ],
    ['s', '2*C_v', 'Units do not agree. Left side is s, right side is a pure number.'],
    [
      '1',
      'h',
      'Units do not agree. Left side is a pure number, right side is cm. Should it be divided by a scale of its own kind?',
    ],
    ['wibble', 'h', 'There is no unit “wibble”. Write units like cm, m/s^2 or °, and 1 for a pure number.'],
    ['cm', 'h + t', 'Units do not agree in “h + t”. Left side is cm, right side is s.'],
  ])('%s = %s: does not agree', (left, text, sentence) => {
    expect(check(left, text)?.replaceAll('\u00A0', ' ')).toBe(sentence);
  });
});
