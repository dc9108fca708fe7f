import type { Reading, ValueReference } from './evidence.ts';
import type { MadeOf } from './findings.ts';
import { keyOf } from './keys.ts';
import { parsedExpression } from './compiled-expression.ts';
import type { Values } from './values.ts';

/** Where an expression stands. */
export interface ExpressionPlace {
  readonly model: string | null;
  readonly series: string | null;
  /** The setting, where there is one. */
  readonly at: Readonly<Record<string, Reading>> | null;
}

/** What an expression was made from at a place, each input as it may be followed further. */
export function madeOfExpression(values: Values, text: string, place: ExpressionPlace): MadeOf {
  const parsed = parsedExpression(values.register, text);
  const refs = parsed.ok ? parsed.expression.inputs.map((id) => inputReference(values, id, place)) : [];
  return { kind: 'expression', expr: text, inputs: refs.map(keyOf), refs };
}

function inputReference(values: Values, id: string, { model, series, at }: ExpressionPlace): ValueReference {
  const equations = model === null ? [] : (values.register.models.get(model)?.equations ?? []);
  if (model !== null && series !== null && equations.some(({ defines }) => defines === id))
    return { kind: 'prediction', model, quantity: id, series, at: { ...at } };
  const finding = series === null ? null : values.finding(id, series);
  if (series === null || finding === null || finding.shape === 'fault')
    return { kind: 'quantity', quantity: id };
  if (finding.shape === 'column' && at !== null) return { kind: 'mean', quantity: id, series, at: { ...at } };
  return { kind: 'quantity', quantity: id, series };
}
