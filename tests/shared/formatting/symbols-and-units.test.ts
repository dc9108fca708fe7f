import katex from 'katex';
import { describe, expect, test } from 'vitest';
import { GREEK_LETTERS } from '#shared/formatting/greek-letters.ts';
import {
  sameSymbol,
  splitSymbol,
  symbolFault,
  symbolToLatex,
  symbolToSpeech,
  symbolToText,
} from '#shared/formatting/symbol.ts';
import { unitToLatex } from '#shared/formatting/unit-latex.ts';
import { unitToText } from '#shared/formatting/unit-text.ts';
import { UNITS } from '#shared/units/unit-table.ts';

const drawn = (latex: string): string => katex.renderToString(latex, { throwOnError: true, strict: 'error' });

describe('symbols', () => {
  test.each([
    ['C_v', 'C_v', 'C_{\\mathrm v}', 'C sub v'],
    ['theta', 'θ', '\\theta', 'theta'],
    ['θ', 'θ', '\\theta', 'theta'],
    ['ϑ_0', 'θ_0', '\\theta_{0}', 'theta sub 0'],
    ['R_max', 'R_max', 'R_{\\mathrm{max}}', 'R sub max'],
    ['R_{max}', 'R_max', 'R_{\\mathrm{max}}', 'R sub max'],
    ['µ', 'μ', '\\mu', 'mu'],
    ['phi', 'φ', '\\varphi', 'phi'],
    ['epsilon_r', 'ε_r', '\\varepsilon_{\\mathrm r}', 'epsilon sub r'],
    ['Delta_h', 'Δ_h', '\\varDelta_{\\mathrm h}', 'capital delta sub h'],
    ['h_sigma', 'h_σ', 'h_{\\sigma}', 'h sub sigma'],
    ['x', 'x', 'x', 'x'],
  ])('%s: is %s in text, %s in LaTeX, “%s” aloud', (symbol, text, latex, speech) => {
    expect(symbolToText(symbol)).toBe(text);
    expect(symbolToLatex(symbol)).toBe(latex);
    expect(symbolToSpeech(symbol)).toBe(speech);
    expect(symbolFault(symbol)).toBeNull();
    expect(() => drawn(latex)).not.toThrow();
  });

  test('sameSymbol: sees through spellings, not through letters', () => {
    expect(sameSymbol('theta_{0}', 'ϑ_0')).toBe(true);
    expect(sameSymbol('c_v', 'C_v')).toBe(false);
  });

  test.each([
    ['', 'Give it a symbol: one letter, then perhaps _ and a label, like v or v_t.'],
    ['speed', 'A symbol is one letter, then perhaps _ and a label. Write s_peed or choose another letter.'],
    ['Re', 'A symbol is one letter, then perhaps _ and a label. Write R_e or choose another letter.'],
    ['v1', 'A symbol is one letter, then perhaps _ and a label. Write v_1 or choose another letter.'],
    ['3x', 'A symbol is one letter, then perhaps _ and a label. Write it like v, v_t or θ_0.'],
    ['C_', 'A symbol is one letter, then perhaps _ and a label. Write it like v, v_t or θ_0.'],
    ['x²', 'A symbol is one letter, then perhaps _ and a label. Write it like v, v_t or θ_0.'],
    ['pi', 'π is kept for the number 3.14159…. Choose another letter, or add a label: π_1.'],
  ])('“%s”: cannot be a symbol', (symbol, sentence) => {
    expect(symbolFault(symbol)).toBe(sentence);
  });

  test('a text that is no symbol: is split into nothing', () => {
    expect(splitSymbol('speed')).toBeNull();
  });

  test.each(GREEK_LETTERS.map(({ name, latex }) => [name, latex]))(
    '%s: has LaTeX that can be drawn',
    (_, latex) => {
      expect(() => drawn(latex)).not.toThrow();
    },
  );
});

describe('units in print', () => {
  test.each([
    ['m/s^2', 'm\u00A0s⁻²', '\\mathrm{m\\,s^{-2}}'],
    ['cm', 'cm', '\\mathrm{cm}'],
    ['°', '°', '^{\\circ}'],
    ['1', '', ''],
    ['J/(kg K)', 'J\u00A0kg⁻¹\u00A0K⁻¹', '\\mathrm{J\\,kg^{-1}\\,K^{-1}}'],
    ['mm^(1/2)', 'mm^(1/2)', '\\mathrm{mm^{1/2}}'],
  ])('%s: is %s in text and %s in LaTeX', (unit, text, latex) => {
    expect(unitToText(unit)).toBe(text);
    expect(unitToLatex(unit)).toBe(latex);
  });

  test('a text that is no unit: comes back as it is', () => {
    expect(unitToText('wibble')).toBe('wibble');
  });

  test.each(UNITS.map(({ names }) => [names[0]]))('%s: has LaTeX that can be drawn', (unit) => {
    expect(() =>
      katex.renderToString(`1${unitToLatex(unit)}`, { throwOnError: true, strict: 'ignore' }),
    ).not.toThrow();
  });
});
