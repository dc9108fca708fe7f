import type { NamedSymbol, ParseResult } from './expression.ts';
import { parseExpression } from './parse-expression.ts';
import { tokenise } from './tokenise.ts';

/**
 * The text to keep: symbols by id, units in brackets, so that renaming a quantity changes nothing.
 *
 * @example toStored('2θ + 38°', [{ id: 'q1', symbol: 'theta' }]) // => { ok: true, stored: '2{q1} + 38 [°]' }
 */
export function toStored(
  text: string,
  symbols: readonly NamedSymbol[],
): { readonly ok: true; readonly stored: string } | Extract<ParseResult, { ok: false }> {
  const parsed = parseExpression(text, symbols);
  return parsed.ok ? { ok: true, stored: parsed.expression.stored } : parsed;
}

/**
 * The text to show and edit: ids replaced by their present symbols. A symbol that has become a unit's name gets a
 * star before it, so that the meaning stays. A quantity that is gone is shown as `?`.
 *
 * @example toShown('2{q1}', [{ id: 'q1', symbol: 'g' }]) // => '2*g'
 */
export function toShown(stored: string, symbols: readonly NamedSymbol[]): string {
  return tokenise(stored, symbols).shown;
}
