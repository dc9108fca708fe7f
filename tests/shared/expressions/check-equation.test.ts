import { describe, expect, test } from 'vitest';
import { checkEquation } from '#shared/expressions/check-equation.ts';
import { expressionToLatex } from '#shared/expressions/expression-to-latex.ts';
import { symbolToLatex } from '#shared/formatting/symbol.ts';
import { DIMENSIONLESS } from '#shared/units/dimension.ts';
import { parseUnit } from '#shared/units/parse-unit.ts';
import { expression, symbols } from './problem-symbols.ts';

const UNITS: Readonly<Record<string, string>> = {
  H: 'cm',
  h: 'cm',
  y: 'cm',
  θ: '°',
  C_v: '1',
  t: 's',
  m: 'g',
};
const known = symbols(...Object.keys(UNITS));
const symbolOf = (id: string) => known.find((row) => row.id === id)?.symbol ?? '?';
const check = (left: string, text: string) =>
  checkEquation({
    left,
    expression: expression(text, known),
    dimensionOf: (id) => {
      const unit = parseUnit(UNITS[symbolOf(id)] ?? '1');
      return unit.ok ? unit.unit.dimension : DIMENSIONLESS;
    },
    unitOf: (id) => UNITS[symbolOf(id)] ?? '1',
  });
const RANGE = 'H*sin(2*θ) + 2*cos(θ)*sqrt(H*(H*sin(θ)^2 + y))';

describe('units of an equation', () => {
  test.each([
    ['cm', RANGE],
    ['cm', 'C_v^2*h'],
    ['mm', 'H + 2 [mm]'],
    ['1', 'sin(θ) + H/y'],
  ])('%s = %s: agree', (left, text) => {
    expect(check(left, text)).toBeNull();
  });

  test('a root that was forgotten: the sentence names both sides and asks for it', () => {
    const fault = check('cm', 'H*(H + y)');

    expect(fault?.code).toBe('dimension mismatch');
    expect(fault?.sentence).toMatch(/Left side is cm/);
    expect(fault?.sentence).toMatch(/square root/i);
  });

  test('a length added to a time: the place is the sum', () => {
    const fault = check('cm', 'H + t');

    expect(fault?.code).toBe('dimension mismatch');
    expect('H + t'.slice(fault?.span.from, fault?.span.to)).toContain('t');
  });

  test('an exponential of a length: refused', () => {
    expect(check('1', 'exp(H)')?.code).toBe('dimension mismatch');
  });
});

describe('an expression typeset', () => {
  const latex = (text: string) =>
    expressionToLatex(expression(text, known), { symbol: (id) => symbolToLatex(symbolOf(id)) });

  test('the range of the leaning spout: as one writes it by hand', () => {
    expect(latex(RANGE).replaceAll(/\s|\\,|\\!|\\left|\\right/g, '')).toBe(
      'H\\sin2\\theta+2\\cos\\theta\\sqrt{H(H\\sin^{2}\\theta+y)}',
    );
  });

  test('a power of a symbol with a label: the label stays upright', () => {
    expect(latex('C_v^2*h')).toMatch(/C_\{\\mathrm\s?\{?v\}?\}\^\{?2\}?/);
  });
});
