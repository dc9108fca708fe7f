import type { Expression, ExpressionFault, NamedSymbol } from '#shared/expressions/expression.ts';
import { parseExpression } from '#shared/expressions/parse-expression.ts';

const GREEK: Readonly<Record<string, string>> = { θ: 'theta', σ: 'sigma', ρ: 'rho', η: 'eta' };

/** Symbols as a register; ids are `q-` and the symbol, Greek letters by name. */
export function symbols(...names: readonly string[]): readonly NamedSymbol[] {
  return names.map((symbol) => ({
    id: `q-${symbol.replace('_', '-').replace(/[θσρη]/gu, (letter) => GREEK[letter] ?? letter)}`,
    symbol,
  }));
}

/** The expression of a text, which must be one. */
export function expression(text: string, known: readonly NamedSymbol[]): Expression {
  const result = parseExpression(text, known);
  if (!result.ok) throw new Error(`${text}: ${result.fault.sentence}`);
  return result.expression;
}

/** The fault of a text, which must have one, and the piece of shown text it points at. */
export function faultOf(
  text: string,
  known: readonly NamedSymbol[],
): ExpressionFault & { readonly at: string } {
  const result = parseExpression(text, known);
  if (result.ok) throw new Error(`${text} was read as ${result.expression.stored}`);
  return { ...result.fault, at: result.shown.slice(result.fault.span.from, result.fault.span.to) };
}
