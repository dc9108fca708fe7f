import type { Comparison, Evidence } from '#shared/evidence/evidence.ts';
import type { Fields } from './fields.ts';
import { checkRange, checkReading } from './numbers.ts';
import { checkReference, checkSelection } from './references.ts';

export function checkComparison(comparison: Comparison, evidence: Evidence, fields: Fields): Comparison {
  checkReference(evidence, 'models', comparison.model, 'row.model', fields);
  checkSelection(evidence, comparison.selection, 'row.selection', fields);
  comparison.free.forEach((parameter, index) => {
    const path = `row.free.${index}`;
    checkReference(evidence, 'quantities', parameter.quantity, `${path}.quantity`, fields);
    checkReading(parameter.start, `${path}.start`, fields);
    checkRange(parameter, path, fields);
    if (comparison.free.findIndex(({ quantity }) => quantity === parameter.quantity) < index) {
      fields.refuse(`${path}.quantity`, 'This parameter is free already. Name each once.');
    }
  });
  return comparison;
}
