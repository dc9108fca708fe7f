import type { Evidence, Model } from '#shared/evidence/evidence.ts';
import { checkExpression } from './expression.ts';
import type { Fields } from './fields.ts';
import { checkRange } from './numbers.ts';
import { checkReference } from './references.ts';

export function checkModel(model: Model, evidence: Evidence, fields: Fields): Model {
  checkReference(evidence, 'quantities', model.output, 'row.output', fields);
  model.limits.forEach((limit, index) => {
    checkReference(evidence, 'quantities', limit.quantity, `row.limits.${index}.quantity`, fields);
    checkRange(limit, `row.limits.${index}`, fields);
  });
  const equations = model.equations.map((equation, index) => {
    const path = `row.equations.${index}`;
    checkReference(evidence, 'quantities', equation.defines, `${path}.defines`, fields);
    if (model.equations.findIndex(({ defines }) => defines === equation.defines) < index) {
      fields.refuse(
        `${path}.defines`,
        'Another equation of this model defines it already. Keep one of the two.',
      );
    }
    return { ...equation, expr: checkExpression(equation.expr, evidence, `${path}.expr`, fields) };
  });
  const assumptions = model.assumptions.map((assumption, index) => {
    if (assumption.size === undefined) return assumption;
    const size = checkExpression(assumption.size, evidence, `row.assumptions.${index}.size`, fields);
    return { ...assumption, size };
  });
  return { ...model, equations, assumptions };
}
