import { atLeast, BINDING, inBrackets, latexPart, type LatexPart } from './latex-part.ts';

/**
 * Factors side by side as a printed formula has them: nothing between letters, a dot where figures, units or an open
 * function would run together with what follows.
 *
 * @param factors - at least one
 */
export function productPart(factors: readonly LatexPart[]): LatexPart {
  const held = factors.map((factor, i) => heldFactor(factor, i));
  const [first = latexPart('1'), ...rest] = held;
  let latex = first.latex;
  let before = first;
  for (const factor of rest) {
    latex += between(before, factor) + factor.latex;
    before = factor;
  }
  if (rest.length === 0) return first;
  return latexPart(latex, {
    binding: BINDING.product,
    startsWithFigure: first.startsWithFigure,
    startsWithSign: first.startsWithSign,
    ends: before.ends,
    kind: held.every(({ kind }) => kind === 'letter' || kind === 'figure') ? 'letter' : 'other',
    isTall: held.some(({ isTall }) => isTall),
  });
}

/** Numerator over denominator; small numbers alone stay in the line. */
export function fractionPart(top: LatexPart, bottom: LatexPart): LatexPart {
  return latexPart(`\\frac{${top.latex}}{${bottom.latex}}`, {
    kind: 'fraction',
    startsWithFigure: top.startsWithFigure && top.kind === 'figure',
    isTall: true,
  });
}

/** A later factor with a minus stands in brackets; a first one may not. */
function heldFactor(factor: LatexPart, index: number): LatexPart {
  if (index > 0 && factor.startsWithSign && factor.kind !== 'bracket') return inBrackets(factor);
  return factor.startsWithSign && factor.kind === 'figure' ? factor : atLeast(factor, BINDING.product);
}

function between(before: LatexPart, after: LatexPart): string {
  if (after.startsWithFigure || before.ends === 'unit') return '\\cdot ';
  if (before.ends === 'open function') {
    if (after.kind === 'root') return '\\,';
    return after.kind === 'function' ? ' ' : '\\cdot ';
  }
  return /[A-Za-z]$/u.test(before.latex) && /\\[A-Za-z]+$/u.test(before.latex) ? ' ' : '';
}
