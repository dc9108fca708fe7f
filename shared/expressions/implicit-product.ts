import type { ExpressionFault, Span } from './expression.ts';
import { expressionFault } from './tokens.ts';

/** What stands before a place where no operator was written. */
export interface Operand {
  readonly kind: 'number' | 'measure' | 'symbol' | 'close';
  readonly span: Span;
  /** It stands behind `/` with no bracket, or behind `^`. */
  readonly isDivisor: boolean;
  readonly isExponent: boolean;
}

/** What follows it. */
export interface Follower {
  readonly kind: 'number' | 'symbol' | 'function' | 'bracket' | 'bar' | 'unit';
  readonly span: Span;
  readonly spaced: boolean;
}

/**
 * Decides whether two operands with nothing between are a product. They are, unless the text could be read in
 * another way: `x(x+1)`, `1/2 m`, `a/b c`, `x^2y`, `x 2`.
 *
 * @param shown - the whole text, for the readings offered
 * @returns null when it is a product
 * @example implicitProduct({ kind: 'number', span: { from: 0, to: 1 }, isDivisor: false, isExponent: false }, { kind: 'symbol', span: { from: 1, to: 2 }, spaced: false }, '2y') // => null
 */
export function implicitProduct(before: Operand, after: Follower, shown: string): ExpressionFault | null {
  const span = { from: before.span.from, to: after.span.to };
  const typed = shown.slice(span.from, span.to);
  const left = shown.slice(before.span.from, before.span.to);
  const right = shown.slice(after.span.from, after.span.to);
  const opensBar = before.kind === 'number' && !before.isDivisor && !before.isExponent;
  if (after.kind === 'bar' && !opensBar)
    return ambiguous(span, `Write |…| as abs(…), so that “${typed}” has one reading.`);
  if (after.kind === 'number') {
    return before.kind === 'number'
      ? expressionFault('syntax', `Something is missing between ${left} and ${right}.`, span, [
          left + right,
          `${left}*${right}`,
        ])
      : expressionFault(
          'syntax',
          `Something is missing between ${left} and ${right}. Write ${left}*${right} if a product is meant.`,
          span,
          [`${left}*${right}`],
        );
  }
  if (before.isDivisor) {
    const [one, two] = [`${left}*${right}`, `(${left}*${right})`];
    const sentence = `What “${typed}” divides by can be read in two ways. Write /${one} or /${two}.`;
    return ambiguous(span, sentence, [one, two]);
  }
  if (before.isExponent && !after.spaced) {
    const [one, two] = [`${left}*${right}`, `(${left}*${right})`];
    return ambiguous(span, `The power “${typed}” can be read in two ways. Write ^${one} or ^${two}.`, [
      one,
      two,
    ]);
  }
  if (before.kind === 'symbol' && after.kind === 'bracket') {
    const product = `${left}*${right}`;
    return ambiguous(span, `${left} is a quantity, not a function. Write ${product} if a product is meant.`, [
      product,
    ]);
  }
  return null;
}

function ambiguous(span: Span, sentence: string, suggestions: readonly string[] = []): ExpressionFault {
  return expressionFault('ambiguous text', sentence, span, suggestions);
}
