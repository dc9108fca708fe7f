import type { ExpressionFault, Span } from './expression.ts';

/** A piece of an expression's text; spans refer to the shown text. */
export type Token = {
  readonly span: Span;
  /** White space stands before it. */
  readonly spaced: boolean;
} & (
  | { readonly kind: 'number'; readonly text: string }
  /** Letters with an optional subscript, or ° and % with their like. */
  | { readonly kind: 'name'; readonly text: string }
  /** `{id}` of the stored form. */
  | { readonly kind: 'id'; readonly id: string }
  /** Raised figures: a whole power. */
  | { readonly kind: 'raised'; readonly power: number }
  /** What stands in square brackets. */
  | { readonly kind: 'unit'; readonly text: string }
  /** An operator, bracket, comma or bar in its plain form. */
  | { readonly kind: 'sign'; readonly text: string }
);

/**
 * A fault of an expression, put together.
 *
 * @param span - in the shown text
 * @param suggestions - texts to put in place of the span
 * @example expressionFault('syntax', 'Something is missing.', { from: 0, to: 1 }).suggestions // => []
 */
export function expressionFault(
  code: ExpressionFault['code'],
  sentence: string,
  span: Span,
  suggestions: readonly string[] = [],
): ExpressionFault {
  return { code, sentence, span, suggestions };
}
