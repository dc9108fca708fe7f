import { parsedExpression } from '#shared/evidence/compiled-expression.ts';
import type { Evidence, ValueReference } from '#shared/evidence/evidence.ts';
import type { Scalar } from '#shared/evidence/findings.ts';
import { registerOf } from '#shared/evidence/register.ts';
import { expressionToLatex } from '#shared/expressions/expression-to-latex.ts';
import { symbolToLatex } from '#shared/formatting/symbol.ts';
import { valueQuantity } from './value-symbol.ts';

/** The formula by which a value was computed, in LaTeX with its left side; null: by none. */
export function provenanceFormula(ref: ValueReference, scalar: Scalar, evidence: Evidence): string | null {
  if (scalar.madeOf.kind !== 'expression') return null;
  const register = registerOf(evidence);
  const symbol = (id: string) => symbolToLatex(register.quantities.get(id)?.symbol ?? '?');
  const parsed = parsedExpression(register, scalar.madeOf.expr);
  if (!parsed.ok) return null;
  const quantity = valueQuantity(ref);
  const right = expressionToLatex(parsed.expression, { symbol });
  return quantity === null ? right : `${symbol(quantity)} = ${right}`;
}
