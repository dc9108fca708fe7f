import katex from 'katex';
import { describe, expect, test } from 'vitest';
import { expressionToLatex } from '#shared/expressions/expression-to-latex.ts';
import { symbolToLatex } from '#shared/formatting/symbol.ts';
import { expression, symbols } from './problem-symbols.ts';

const known = symbols(
  'θ',
  'h',
  'C_v',
  'm',
  'g',
  'x',
  'y',
  'H',
  'a',
  'b',
  'rho',
  'A',
  'C_d',
  'v',
  'n',
  't',
  'tau',
);
const symbol = (id: string): string => symbolToLatex(known.find((each) => each.id === id)?.symbol ?? '');
const PUT: Readonly<Record<string, string>> = {
  'q-theta': '\\htmlClass{fm}{38.0^{\\circ}}',
  'q-h': '\\htmlClass{fm}{20.0\\,\\mathrm{cm}}',
  'q-H': '\\htmlClass{fp}{18.7\\,\\mathrm{cm}}',
  'q-y': '\\htmlClass{fm}{12.0\\,\\mathrm{cm}}',
  'q-C-v': '\\htmlClass{fp}{0.967}',
  'q-x': '\\htmlClass{fm}{{-}3.0\\,\\mathrm{cm}}',
};
const put = (id: string): string | null => PUT[id] ?? null;
const plainly = (latex: string): string => latex.replace(/\\htmlClass\{f[mp]\}/gu, '');

describe('expression to LaTeX', () => {
  test.each([
    [
      'H*sin(2θ) + 2*cos(θ)*sqrt(H*(H*sin(θ)^2 + y))',
      'H\\sin 2\\theta+2\\cos \\theta\\,\\sqrt{H(H\\sin^{2} \\theta+y)}',
    ],
    ['C_v^2*h', 'C_{\\mathrm v}^{2}h'],
    ['2*sqrt(H*(H+y))', '2\\sqrt{H(H+y)}'],
    ['atan(sqrt(H/(H+y)))', '\\arctan\\left(\\sqrt{\\frac{H}{H+y}}\\right)'],
    ['sqrt(2*m*g/(rho*C_d*A))', '\\sqrt{\\frac{2mg}{\\rho C_{\\mathrm d}A}}'],
    ['v^2/(2*g)*log(1+v^2/x^2)', '\\frac{v^{2}}{2g}\\ln\\left(1+\\frac{v^{2}}{x^{2}}\\right)'],
    ['1/2*m*v^2', '\\frac{1}{2}mv^{2}'],
    ['exp(-t/tau)', '\\exp\\left(-\\frac{t}{\\tau}\\right)'],
    ['exp(-x)', '\\mathrm{e}^{-x}'],
    ['x^(1/3)', 'x^{1/3}'],
    ['a^(b/x)', 'a^{b/x}'],
    ['(a+b)^2', '(a+b)^{2}'],
    ['(a/b)^2', '\\left(\\frac{a}{b}\\right)^{2}'],
    ['-x^2', '-x^{2}'],
    ['-a*b', '-ab'],
    ['-(a+b)', '-(a+b)'],
    ['a-(b-x)', 'a-(b-x)'],
    ['a+(b+x)', 'a+b+x'],
    ['a+(-x)', 'a+(-x)'],
    ['a*(-x)', 'a(-x)'],
    ['2*3*x', '2\\cdot 3x'],
    ['x*2', 'x\\cdot 2'],
    ['sin(a)*x', '\\sin a\\cdot x'],
    ['x*sin(a)', 'x\\sin a'],
    ['sin(a)*cos(b)', '\\sin a \\cos b'],
    ['sin(a+b)', '\\sin(a+b)'],
    ['sin(x^2)', '\\sin(x^{2})'],
    ['sin(2*a^2)', '\\sin(2a^{2})'],
    ['log10(x)^2', '(\\log_{10} x)^{2}'],
    ['(x^y)^2', '(x^{y})^{2}'],
    ['x^y^2', 'x^{y^{2}}'],
    ['abs(x/a)', '\\left|\\frac{x}{a}\\right|'],
    ['hypot(x, y)', '\\sqrt{x^{2}+y^{2}}'],
    ['min(a, b)', '\\min(a, b)'],
    ['log1p(x)', '\\ln(1+x)'],
    ['2.5 [mm]*x', '2.5\\,\\mathrm{mm}\\cdot x'],
    ['θ + 38°', '\\theta+38^{\\circ}'],
    ['2e-3*x', '2\\times 10^{-3}\\cdot x'],
    ['300 < n <= 2e5', '300<n\\le 2\\times 10^{5}'],
    ['a < b ? x : y', '\\begin{cases}x & \\text{if } a<b \\\\ y & \\text{otherwise}\\end{cases}'],
    ['2*pi*sqrt(h/g)', '2\\pi \\sqrt{\\frac{h}{g}}'],
  ])('%s: is set as %s', (text, expected) => {
    const latex = expressionToLatex(expression(text, known), { symbol });

    expect(latex).toBe(expected);
    expect(() => katex.renderToString(latex, { throwOnError: true, strict: 'error' })).not.toThrow();
  });

  test.each([
    [
      'H*sin(2θ) + 2*cos(θ)*sqrt(H*(H*sin(θ)^2 + y))',
      '{18.7\\,\\mathrm{cm}}\\cdot \\sin(2\\cdot {38.0^{\\circ}})+2\\cos {38.0^{\\circ}}\\,\\sqrt{{18.7\\,\\mathrm{cm}}\\cdot ({18.7\\,\\mathrm{cm}}\\cdot \\sin^{2} {38.0^{\\circ}}+{12.0\\,\\mathrm{cm}})}',
    ],
    ['C_v^2*h', '{0.967}^{2}\\cdot {20.0\\,\\mathrm{cm}}'],
    ['h^2', '({20.0\\,\\mathrm{cm}})^{2}'],
    ['a*x', 'a({{-}3.0\\,\\mathrm{cm}})'],
    ['a - x', 'a-({{-}3.0\\,\\mathrm{cm}})'],
    ['-x', '-({{-}3.0\\,\\mathrm{cm}})'],
    ['x/2', '\\frac{{{-}3.0\\,\\mathrm{cm}}}{2}'],
    ['h/y', '\\frac{{20.0\\,\\mathrm{cm}}}{{12.0\\,\\mathrm{cm}}}'],
    ['m*a', 'ma'],
  ])('%s with its numbers put in: is set as %s', (text, expected) => {
    const latex = expressionToLatex(expression(text, known), { symbol, put });

    expect(plainly(latex)).toBe(expected);
    expect(() =>
      katex.renderToString(latex, { throwOnError: true, strict: 'ignore', trust: true }),
    ).not.toThrow();
  });

  test('classes of put-in numbers: arrive at the page', () => {
    const latex = expressionToLatex(expression('C_v^2*h', known), { symbol, put });

    const html = katex.renderToString(latex, { strict: 'ignore', trust: true });

    expect(html).toContain('class="enclosing fp"');
    expect(html).toContain('class="enclosing fm"');
  });
});
