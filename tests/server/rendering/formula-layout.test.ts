import katex from 'katex';
import { describe, expect, test } from 'vitest';
import type { LeafItem } from '#server/rendering/formulas/formula-box.ts';
import { layOutFormula, type FormulaLayout } from '#server/rendering/formulas/formula-layout.ts';
import { pathOperators } from '#server/rendering/formulas/svg-path.ts';

const COLOURS = { measured: '#086C9A', predicted: '#8D4A00' };

function layOut(latex: string, display = true): Extract<FormulaLayout, { ok: true }> {
  const layout = layOutFormula(latex, display, COLOURS);
  if (!layout.ok) throw new Error(layout.reason);
  return layout;
}

function items(latex: string): readonly LeafItem[] {
  return layOut(latex).parts.flatMap((part) => part.items);
}

function textOf(latex: string): string {
  return items(latex)
    .flatMap((item) => (item.kind === 'glyph' ? [String.fromCodePoint(...item.glyph.codePoints)] : []))
    .join('');
}

/** Heights that KaTeX itself writes into its HTML: the strut of each unbreakable piece. */
function struts(latex: string): { height: number; depth: number }[] {
  const html = katex.renderToString(latex, { displayMode: true, output: 'html' });
  return [...html.matchAll(/katex-strut" style="height:([\d.]+)em;(?:vertical-align:-([\d.]+)em)?/gu)].map(
    (match) => {
      const depth = Number(match[2] ?? 0);
      return { height: Number(match[1]) - depth, depth };
    },
  );
}

const FORMULAS = [
  'R = H\\sin 2\\theta + 2\\cos\\theta\\sqrt{H(H\\sin^2\\theta + y)}',
  '\\int_0^\\infty e^{-x^2}\\,\\mathrm dx = \\frac{\\sqrt\\pi}{2}',
  '\\sum_{i=1}^{n}\\frac{(x_i-\\bar x)^2}{n-1}',
  '\\begin{pmatrix}a&b\\\\c&d\\end{pmatrix}',
  '\\left(\\frac{a}{\\sum_k b_k}\\right)^{2}',
  '\\overbrace{x+y}^{n}\\;\\underline{u}\\;\\boxed{E}',
];

describe('layOutFormula', () => {
  test.each(FORMULAS)('%s, when laid out: has the heights that KaTeX gives its pieces', (latex) => {
    const { parts } = layOut(latex);

    const expected = struts(latex);

    expect(parts).toHaveLength(expected.length);
    parts.forEach((part, i) => {
      expect(part.height).toBeCloseTo(expected[i]?.height ?? NaN, 3);
      expect(part.depth).toBeCloseTo(expected[i]?.depth ?? NaN, 3);
    });
  });

  test.each(FORMULAS)('%s, when laid out: keeps every glyph inside its height and depth', (latex) => {
    for (const part of layOut(latex).parts) {
      for (const item of part.items) {
        expect(item.y).toBeGreaterThanOrEqual(-part.height - 0.7);
        expect(item.y).toBeLessThanOrEqual(part.depth + 0.7);
      }
    }
  });

  test('a fraction, when laid out: centres its numerator over a bar as wide as its denominator', () => {
    const parts = items('\\frac{1}{\\mathbb{A}\\mathbb{A}\\mathbb{A}}');
    const bar = parts.find((item) => item.kind === 'rule');
    const one = parts.find((item) => item.kind === 'glyph' && item.glyph.codePoints[0] === 0x31);
    const letter = parts.find((item) => item.kind === 'glyph' && item.glyph.codePoints[0] === 0x41);

    // KaTeX_AMS-Regular: the advance of double-struck A is 0.722 em; STIX Two Text: that of the figure 1 is 0.481 em.
    const width = 3 * 0.722;
    expect(bar && 'width' in bar ? bar.width : NaN).toBeCloseTo(width, 2);
    expect((one?.x ?? NaN) - (bar?.x ?? NaN)).toBeGreaterThan((width - 0.6) / 2);
    expect((one?.x ?? NaN) - (bar?.x ?? NaN)).toBeLessThan((width - 0.3) / 2);
    expect(letter?.x).toBeCloseTo(bar?.x ?? NaN, 6);
  });

  test('a superscript, when laid out: stands where KaTeX puts it, at seven tenths', () => {
    const two = items('x^2').find((item) => item.kind === 'glyph' && item.size < 1);

    // KaTeX: sup1 of the display style lifts by 0.413 em.
    expect(two).toMatchObject({ size: 0.7 });
    expect(two?.y).toBeCloseTo(-0.413, 2);
  });

  test('a root without braces, when laid out: clears its radicand', () => {
    const [radicand] = items('\\sqrt\\pi');

    expect(radicand?.x).toBeGreaterThan(0.8);
  });

  test('numbers that are put in, when laid out: carry the colour of what they are', () => {
    const colours = items('\\htmlClass{fm}{1} + \\htmlClass{fp}{2} + 3').flatMap((item) =>
      item.kind === 'glyph' ? [item.colour] : [],
    );

    expect(colours).toEqual([COLOURS.measured, null, COLOURS.predicted, null, null]);
  });

  test('other classes and commands that could reach out, when typed: are refused', () => {
    expect(layOutFormula('\\htmlClass{evil}{1}', true, COLOURS).ok).toBe(true);
    expect(textOf('\\htmlClass{evil}{1}')).not.toBe('1');
    expect(layOutFormula('\\frac{1}', true, COLOURS)).toMatchObject({ ok: false });
  });

  test('glyphs of a formula, when read in order: are its text', () => {
    expect(textOf('a + b = \\sin\\theta')).toBe('a+b=sinθ');
  });

  test('a long formula in a sentence, when laid out: has a piece for each relation, so that lines may break', () => {
    expect(layOut('a = b + c = d', false).parts.length).toBeGreaterThan(2);
  });
});

describe('pathOperators', () => {
  test('relative and smooth commands, when turned: are the absolute curves', () => {
    expect(pathOperators('M1 2l3 4h-1v2c1 0 2 1 2 2s1 2 2 2z').split('\n')).toEqual([
      '1 2 m',
      '4 6 l',
      '3 6 l',
      '3 8 l',
      '4 8 5 9 5 10 c',
      '5 11 6 12 7 12 c',
      'h',
    ]);
  });

  test('a quadratic curve, when turned: is the cubic with controls at two thirds', () => {
    expect(pathOperators('M0 0Q3 3 6 0')).toBe('0 0 m\n2 2 4 2 6 0 c');
  });
});
