import { sameSymbol, symbolFault } from '#shared/formatting/symbol.ts';
import type { Evidence, Quantity, QuantityDefinition } from '#shared/evidence/evidence.ts';
import { checkExpression } from './expression.ts';
import type { Fields } from './fields.ts';
import { checkParts, checkReading, checkUnit } from './numbers.ts';
import { checkReference, checkSelection } from './references.ts';

/** A symbol that can be typeset and is free, a unit that can be read, and a definition that can be read. */
export function checkQuantity(quantity: Quantity, evidence: Evidence, fields: Fields): Quantity {
  const fault = symbolFault(quantity.symbol);
  if (fault !== null) fields.refuse('row.symbol', fault);
  const other = evidence.quantities.find(
    ({ id, symbol }) => id !== quantity.id && sameSymbol(symbol, quantity.symbol),
  );
  if (other) {
    fields.refuse(
      'row.symbol',
      `${other.symbol} is “${other.name}” already. Use another letter or a subscript.`,
    );
  }
  checkUnit(quantity.unit, 'row.unit', fields);
  return { ...quantity, def: checkOrigin(quantity.def, evidence, fields) };
}

function checkOrigin(def: QuantityDefinition, evidence: Evidence, fields: Fields): QuantityDefinition {
  switch (def.origin) {
    case 'constant':
      checkReading(def.reading, 'row.def.reading', fields);
      checkParts(def.parts, 'row.def.parts', fields);
      checkInstrument(def.instrument ?? null, evidence, fields);
      return def;
    case 'recorded':
      checkInstrument(def.instrument, evidence, fields);
      return def;
    case 'derived':
      return { ...def, expr: checkExpression(def.expr, evidence, 'row.def.expr', fields) };
    case 'summary':
      checkReference(evidence, 'quantities', def.of, 'row.def.of', fields);
      if (def.against !== undefined) {
        checkReference(evidence, 'quantities', def.against, 'row.def.against', fields);
      }
      checkSelection(evidence, def.where, 'row.def.where', fields);
      return def;
    case 'fitted':
      checkReference(evidence, 'comparisons', def.comparison, 'row.def.comparison', fields);
      return def;
    case 'predicted':
      checkReference(evidence, 'models', def.model, 'row.def.model', fields);
      return def;
  }
}

function checkInstrument(id: string | null, evidence: Evidence, fields: Fields): void {
  if (id !== null) checkReference(evidence, 'instruments', id, 'row.def.instrument', fields);
}
