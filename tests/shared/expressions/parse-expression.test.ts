import { describe, expect, test } from 'vitest';
import type { ExpressionNode } from '#shared/expressions/expression.ts';
import { parseExpression } from '#shared/expressions/parse-expression.ts';
import { expression, faultOf, symbols } from './problem-symbols.ts';

const known = symbols('θ', 'h', 'R', 'C_v', 'm', 'g', 'x', 'y', 'H', 'a', 'b', 'c', 'R_max');

/** Every bracket written out, ids as their symbols. */
function written(node: ExpressionNode): string {
  switch (node.kind) {
    case 'number':
      return node.text;
    case 'measure':
      return `${node.text}[${node.unit}]`;
    case 'symbol':
      return known.find(({ id }) => id === node.id)?.symbol ?? node.id;
    case 'pi':
      return 'π';
    case 'negative':
      return `(-${written(node.of)})`;
    case 'binary':
      return `(${written(node.left)}${node.operator}${written(node.right)})`;
    case 'call':
      return `${node.name}(${node.inputs.map(written).join(',')})`;
    case 'comparison':
      return `(${node.terms.map((term, i) => written(term) + (node.operators[i] ?? '')).join('')})`;
    case 'choice':
      return `(${written(node.when)}?${written(node.then)}:${written(node.otherwise)})`;
  }
}

describe('parse expression', () => {
  test.each([
    ['C_v^2*h', '((C_v^2)*h)'],
    ['C_v²·h', '((C_v^2)*h)'],
    ['x⁻¹', '(x^-1)'],
    ['x × y ÷ 2', '((x*y)/2)'],
    ['x − y', '(x-y)'],
    ['−x', '(-x)'],
    ['-x^2', '(-(x^2))'],
    ['2^-x', '(2^(-x))'],
    ['x^y^2', '(x^(y^2))'],
    ['x - y - 2', '((x-y)-2)'],
    ['x / y * 2', '((x/y)*2)'],
    ['x**2', '(x^2)'],
    ['|x|', 'abs(x)'],
    ['2|x| + |y|', '((2*abs(x))+abs(y))'],
    ['√(x)', 'sqrt(x)'],
    ['ln(x)', 'log(x)'],
    ['log(x)', 'log(x)'],
    ['arctan(x)', 'atan(x)'],
    ['log10(x)', 'log10(x)'],
    ['atan2(y, x)', 'atan2(y,x)'],
    ['max(1,2.5)', 'max(1,2.5)'],
    ['sin²(θ)', '(sin(θ)^2)'],
    ['sin^2(θ)', '(sin(θ)^2)'],
    ['sin(θ)^2', '(sin(θ)^2)'],
    ['2pi*x', '((2*π)*x)'],
    ['2π', '(2*π)'],
    ['theta', 'θ'],
    ['ϑ', 'θ'],
    ['R_{max}', 'R_max'],
    ['a < b', '(a<b)'],
    ['a ≤ b', '(a<=b)'],
    ['300 < x <= 2e5', '(300<x<=2e5)'],
    ['a < b ? x : y', '((a<b)?x:y)'],
    ['a < b ? x : b < c ? y : 2', '((a<b)?x:((b<c)?y:2))'],
    ['.5*x + 1.', '((.5*x)+1.)'],
    ['1.5e-3*x', '(1.5e-3*x)'],
    ['12\u202F345.6', '12345.6'],
  ])('%s: is read as %s', (text, expected) => {
    expect(written(expression(text, known).root)).toBe(expected);
  });

  test.each([
    ['2θ', '(2*θ)'],
    ['2 C_v', '(2*C_v)'],
    ['2(a+b)', '(2*(a+b))'],
    ['(a+b)(a-b)', '((a+b)*(a-b))'],
    ['(a+b) x', '((a+b)*x)'],
    ['H sin(2θ)', '(H*sin((2*θ)))'],
    ['2 cos(θ) sqrt(x)', '((2*cos(θ))*sqrt(x))'],
    ['x y', '(x*y)'],
    ['x²y', '((x^2)*y)'],
    ['x^2 y', '((x^2)*y)'],
    ['-2x', '((-2)*x)'],
  ])('%s: is a product without a sign, %s', (text, expected) => {
    expect(written(expression(text, known).root)).toBe(expected);
  });

  test.each([
    ['2.5 mm', '2.5[mm]'],
    ['2 [cm]', '2[cm]'],
    ['2 [g]', '2[g]'],
    ['5 s', '5[s]'],
    ['3 min', '3[min]'],
    ['9.81 [m/s^2]', '9.81[m/s^2]'],
    ['3 kg/s^2', '3[kg/s^2]'],
    ['5 kg·s⁻²', '5[kg/s^2]'],
    ['38°', '38[°]'],
    ['5 %', '5[%]'],
    ['20 °C', '20[°C]'],
    ['-20 °C', '-20[°C]'],
    ['(1/2) [m]', '((1/2)*1[m])'],
    ['1/(2 [m])', '(1/2[m])'],
    ['x*38° + y', '((x*38[°])+y)'],
    ['3 N θ', '(3[N]*θ)'],
    ['2 min(x, y)', '(2*min(x,y))'],
  ])('%s: has a unit, %s', (text, expected) => {
    expect(written(expression(text, known).root)).toBe(expected);
  });

  test('numbers with units: are held in SI', () => {
    expect(expression('2.5 mm', known).root).toMatchObject({ value: 0.0025 });
    expect(expression('-20 °C', known).root).toMatchObject({ value: 253.15 });
  });

  test('inputs: each once, in the order of their first place', () => {
    expect(expression('y + x*y + C_v', known).inputs).toEqual(['q-y', 'q-x', 'q-C-v']);
  });

  test('spans: point at the pieces of the shown text', () => {
    const { root, shown } = expression('x + (a+b)*sqrt(y)', known);
    if (root.kind !== 'binary' || root.right.kind !== 'binary') throw new Error('another tree');
    const piece = ({ span }: ExpressionNode): string => shown.slice(span.from, span.to);

    expect([root.left, root.right, root.right.left, root.right.right].map(piece)).toEqual([
      'x',
      '(a+b)*sqrt(y)',
      '(a+b)',
      'sqrt(y)',
    ]);
  });
});

describe('what can be read in two ways', () => {
  test.each([
    ['2mg', '“2mg” can be read in two ways. Write 2*m*g or 2 [mg].', ['2*m*g', '2 [mg]']],
    ['2 g', '“2 g” can be read in two ways. Write 2*g or 2 [g].', ['2*g', '2 [g]']],
    ['2h', '“2h” can be read in two ways. Write 2*h or 2 [h].', ['2*h', '2 [h]']],
    ['1/2 m', '“2 m” can be read in two ways. Write 2*m or 2 [m].', ['2*m', '2 [m]']],
    ['5 kg m', '“5 kg m” can be read in two ways. Write 5 [kg m] or 5 [kg]*m.', ['5 [kg m]', '5 [kg]*m']],
    ['5 kg/m', '“5 kg/m” can be read in two ways. Write 5 [kg/m] or 5 [kg]/m.', ['5 [kg/m]', '5 [kg]/m']],
    [
      'x/2 s',
      '“/2 s” can be read in two ways. Write /(2 [s]), or put the unit behind a bracket round the whole.',
      ['(2 [s])'],
    ],
    [
      '1/2 [m]',
      '“/2 [m]” can be read in two ways. Write /(2 [m]), or put the unit behind a bracket round the whole.',
      ['(2 [m])'],
    ],
    ['a/b c', 'What “b c” divides by can be read in two ways. Write /b*c or /(b*c).', ['b*c', '(b*c)']],
    ['1/2θ', 'What “2θ” divides by can be read in two ways. Write /2*θ or /(2*θ).', ['2*θ', '(2*θ)']],
    [
      '1/2(a+b)',
      'What “2(a+b)” divides by can be read in two ways. Write /2*(a+b) or /(2*(a+b)).',
      ['2*(a+b)', '(2*(a+b))'],
    ],
    ['a/b^2 c', 'What “2 c” divides by can be read in two ways. Write /2*c or /(2*c).', ['2*c', '(2*c)']],
    ['x^2y', 'The power “2y” can be read in two ways. Write ^2*y or ^(2*y).', ['2*y', '(2*y)']],
    ['x^y²', 'A power of a power can be read in two ways. Use brackets.', []],
    ['x(x+1)', 'x is a quantity, not a function. Write x*(x+1) if a product is meant.', ['x*(x+1)']],
    ['C_v (x+1)', 'C_v is a quantity, not a function. Write C_v*(x+1) if a product is meant.', ['C_v*(x+1)']],
    ['sin x', 'sin needs brackets, to show what it is of. Write sin(x).', ['sin(x)']],
    ['sin 2θ', 'sin needs brackets, to show what it is of. Write sin(2θ).', ['sin(2θ)']],
    ['sin² θ', 'sin needs brackets, to show what it is of. Write sin^2(θ).', ['sin^2(θ)']],
    ['sin⁻¹(x)', '“sin⁻¹” can be read in two ways. Write asin(…) for the inverse function or 1/sin(…).', []],
    ['a|x|', 'Write |…| as abs(…), so that “a|” has one reading.', []],
    ['|a|b|c|', 'Write |…| as abs(…), so that “b|” has one reading.', []],
    ['2 [cm]²', 'The power of 2 [cm] can be read in two ways. Write (2 [cm])^2 or 2 [cm^2].', []],
    ['2 [cm]^3', 'The power of 2 [cm] can be read in two ways. Write (2 [cm])^3 or 2 [cm^3].', []],
    [
      '20 °C + 5 °C',
      'Two temperatures in °C cannot be added. Write the difference in K, like 20 [°C] + 5 [K].',
      [],
    ],
    [
      '2*20 °C',
      'A temperature in °C has its own zero and cannot be multiplied, divided or raised. Write it in K.',
      [],
    ],
  ])('%s: is refused and its readings offered', (text, sentence, suggestions) => {
    const fault = faultOf(text, known);

    expect(fault.sentence).toBe(sentence);
    expect(fault.suggestions).toEqual(suggestions);
    expect(fault.code).toBe('ambiguous text');
  });

  test.each(['2mg', '2 g', '5 kg m', 'x(x+1)', 'sin 2θ', 'a/b c', 'x^2y', '1/2(a+b)'])(
    '%s: every reading offered can be read',
    (text) => {
      const fault = faultOf(text, known);

      const mended = fault.suggestions.map(
        (reading) => text.slice(0, fault.span.from) + reading + text.slice(fault.span.to),
      );

      expect(mended.map((each) => parseExpression(each, known).ok)).toEqual(mended.map(() => true));
    },
  );

  test('names that are units only, without such symbols: need no bracket', () => {
    expect(written(expression('2 g + 2mg + 3 h', symbols('x')).root)).toBe('((2[g]+2[mg])+3[h])');
  });
});

describe('bad input', () => {
  test.each([
    [
      'q',
      'unknown symbol',
      'q',
      '“q” is no quantity of this problem. Add it to the register, or write another.',
    ],
    ['Cv*x', 'unknown symbol', 'Cv', '“Cv” is no quantity of this problem. Did you mean C_v?'],
    ['c_v', 'unknown symbol', 'c_v', '“c_v” is no quantity of this problem. Did you mean C_v or c?'],
    ['thta', 'unknown symbol', 'thta', '“thta” is no quantity of this problem. Did you mean θ?'],
    ['Hh', 'unknown symbol', 'Hh', '“Hh” is no quantity of this problem. Did you mean H*h?'],
    ['2πx', 'unknown symbol', 'πx', '“πx” is no quantity of this problem. Did you mean π*x?'],
    ['x*cm', 'unknown symbol', 'cm', '“cm” is no quantity of this problem. Did you mean c*m?'],
    [
      'x*kg',
      'unknown symbol',
      'kg',
      '“kg” is a unit here, not a quantity. Write it after a number, like 1 [kg].',
    ],
    [
      'e^x',
      'unknown symbol',
      'e',
      '“e” is no quantity of this problem. For the base of the natural logarithm write exp(1), and exp(x) for its power.',
    ],
    [
      'a and b',
      'unknown symbol',
      'and',
      '“and” is no quantity of this problem. Chain comparisons instead: 300 < R < 2000.',
    ],
    ['sqr(x)', 'unknown symbol', 'sqr', 'There is no function “sqr”. Did you mean sqrt?'],
    [
      'foo(x)',
      'unknown symbol',
      'foo',
      'There is no function “foo”. Write sqrt, exp, log, sin, cos, tan, abs, min or max.',
    ],
    ['5 sec', 'unknown unit', 'sec', '“sec” is neither a unit nor a quantity here. Did you mean s?'],
    [
      '3 [foo]',
      'unknown unit',
      '[foo]',
      'There is no unit “foo”. Write units like cm, m/s^2 or °, and 1 for a pure number.',
    ],
    ['3 [cmm]', 'unknown unit', '[cmm]', 'There is no unit “cmm”. Did you mean mm or cm or cm m?'],
    [
      'h [cm]',
      'syntax',
      '[cm]',
      'A unit in brackets stands right after a number. Write 1 [cm] or the number before it.',
    ],
    ['1,5*x', 'syntax', '1,5', '1,5 has a comma; the decimal mark in a formula is a point. Write 1.5.'],
    ['1,234.5', 'syntax', '1,234.5', '1,234.5 has both decimal marks. Write 1234.5.'],
    ['x 2', 'syntax', 'x 2', 'Something is missing between x and 2. Write x*2 if a product is meant.'],
    ['x2', 'syntax', 'x2', 'Something is missing between x and 2. Write x*2 if a product is meant.'],
    ['2 3', 'syntax', '2 3', 'Something is missing between 2 and 3.'],
    ['x+', 'syntax', '+', 'Something is missing after “+”.'],
    ['x*/y', 'syntax', '/', '“/” has no value before it.'],
    ['*x', 'syntax', '*', '“*” has no value before it.'],
    ['(x', 'syntax', '(x', 'A bracket is not closed.'],
    ['|x', 'syntax', '|x', 'A bar | is not closed.'],
    ['x)', 'syntax', ')', 'A bracket is closed that was not opened.'],
    ['sqrt()', 'syntax', ')', 'Something is missing before this bracket.'],
    ['atan2(x)', 'syntax', 'atan2(x)', 'atan2 takes two inputs, not 1.'],
    ['hypot(x,y,a)', 'syntax', 'hypot(x,y,a)', 'hypot takes two inputs, not 3.'],
    ['x, y', 'syntax', ',', 'A comma only stands between the inputs of min, max, hypot or atan2.'],
    ['x = 2', 'syntax', '=', '“=” cannot stand here. Write the right side only, or == to compare.'],
    ['a && b', 'syntax', '&&', '“&&” cannot stand here. Chain comparisons instead: 1 < a < 2.'],
    [
      'x ± 2',
      'syntax',
      '±',
      '“±” cannot stand in a formula. A formula takes values without ±; the uncertainty comes with each quantity.',
    ],
    [
      '\\sqrt{x}',
      'syntax',
      '\\',
      '“\\” cannot stand in a formula. Write formulas as plain text, like sqrt(2*g*h), not in LaTeX.',
    ],
    [
      'x!',
      'syntax',
      '!',
      '“!” cannot stand in a formula. There is no factorial here. Write out the product.',
    ],
    [
      "x'",
      'syntax',
      "'",
      "“'” cannot stand in a formula. A symbol has no prime. Use a label instead, such as v_1.",
    ],
    ['½x', 'syntax', '½', '“½” cannot stand in a formula. Write 1/2 and a star: 1/2*m*v^2.'],
    ['', 'syntax', '', 'Write a formula, such as 2*sqrt(h*y).'],
    ['1e400', 'syntax', '1e400', '1e400 is out of the range of numbers.'],
    [
      '{gone}*x',
      'source gone',
      '?',
      'A quantity that stood here has been removed. Write another in its place.',
    ],
  ])('%s: has fault %s at “%s”', (text, code, at, sentence) => {
    const fault = faultOf(text, known);

    expect({ code: fault.code, at: fault.at, sentence: fault.sentence }).toEqual({ code, at, sentence });
  });

  test.each([
    ['a ? b', 'This cannot be read as a formula. A choice is written condition ? value : other value.'],
    ['a : b', 'This cannot be read as a formula. A choice is written condition ? value : other value.'],
  ])('%s: is refused', (text, sentence) => {
    expect(faultOf(text, known).sentence).toBe(sentence);
  });

  test.each([
    ['thousands of signs', 'x+'.repeat(1500)],
    ['brackets without end', '('.repeat(900) + 'x' + ')'.repeat(900)],
    ['signs without end', '-'.repeat(1900) + 'x'],
    ['powers without end', 'x^'.repeat(900) + 'x'],
    ['prototype names', '__proto__'],
    ['a constructor', 'constructor'],
    ['program text', 'import("fs")'],
    ['a long chain', 'x+'.repeat(900) + 'x'],
  ])('%s: is refused and does no harm', (_, text) => {
    expect(parseExpression(text, known).ok).toBe(false);
  });

  test('many choices in one another: are read, and do no harm', () => {
    expect(parseExpression('x?x:'.repeat(400) + 'x', known).ok).toBe(true);
  });
});
