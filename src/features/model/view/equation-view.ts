import type { Evidence, Model, Quantity } from '#shared/evidence/evidence.ts';
import { checkEquation } from '#shared/expressions/check-equation.ts';
import { expressionToLatex } from '#shared/expressions/expression-to-latex.ts';
import type { Span } from '#shared/expressions/expression.ts';
import { parseExpression } from '#shared/expressions/parse-expression.ts';
import { symbolToLatex } from '#shared/formatting/symbol.ts';
import { unitToText } from '#shared/formatting/unit-text.ts';
import { DIMENSIONLESS } from '#shared/units/dimension.ts';
import { parseUnit } from '#shared/units/parse-unit.ts';

/** An equation of a model as it is read: typeset, with what is wrong with it, if anything. */
export interface EquationView {
  /** "effective head"; null: the quantity is gone. */
  readonly quantity: Quantity | null;
  readonly latex: string | null;
  /** As it is typed, by symbols. */
  readonly typed: string;
  readonly fault: { readonly sentence: string; readonly span: Span } | null;
}

/** `expr` by symbols or as it is stored. */
export function equationView(defines: string, expr: string, evidence: Evidence): EquationView {
  const quantities = new Map(evidence.quantities.map((quantity) => [quantity.id, quantity]));
  const quantity = quantities.get(defines) ?? null;
  const parsed = parseExpression(expr, evidence.quantities);
  if (!parsed.ok) return { quantity, latex: null, typed: parsed.shown, fault: parsed.fault };
  const { expression } = parsed;
  const symbol = (id: string) => symbolToLatex(quantities.get(id)?.symbol ?? '?');
  const unitOf = (id: string) => quantities.get(id)?.unit ?? '1';
  const right = expressionToLatex(expression, { symbol });
  const fault = quantity
    ? checkEquation({
        left: quantity.unit,
        expression,
        dimensionOf: (id) => {
          const unit = parseUnit(unitOf(id));
          return unit.ok ? unit.unit.dimension : DIMENSIONLESS;
        },
        unitOf,
      })
    : null;
  return {
    quantity,
    latex: `${quantity ? symbolToLatex(quantity.symbol) : '?'} = ${right}`,
    typed: expression.shown,
    fault,
  };
}

/** "Units agree, cm on both sides." or null where an equation has a fault. */
export function unitsSentence(model: Model, views: readonly EquationView[]): string | null {
  if (views.some(({ fault }) => fault)) return null;
  const output = views.find(({ quantity }) => quantity?.id === model.output)?.quantity;
  if (!output) return 'Units agree.';
  return output.unit === '1'
    ? 'Units agree; both sides are numbers.'
    : `Units agree, ${unitToText(output.unit)} on both sides.`;
}
