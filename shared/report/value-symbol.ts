import type { Evidence, ValueReference } from '#shared/evidence/evidence.ts';

/** Symbol of the quantity a reference is about, as the register has it; null where it is about none. */
export function valueSymbol(ref: ValueReference, evidence: Evidence): string | null {
  const id = valueQuantity(ref);
  return id === null ? null : (evidence.quantities.find((quantity) => quantity.id === id)?.symbol ?? null);
}

/**
 * Id of the quantity a reference is about; null for counts, and for figures of a fit or a claim.
 *
 * @example valueQuantity({ kind: 'reading', trial: 't1', quantity: 'q7' }) // => 'q7'
 * @example valueQuantity({ kind: 'count', of: 'kept' }) // => null
 */
export function valueQuantity(ref: ValueReference): string | null {
  switch (ref.kind) {
    case 'quantity':
    case 'mean':
    case 'prediction':
    case 'reading':
      return ref.quantity;
    case 'difference':
    case 'fit':
    case 'claim':
    case 'count':
      return null;
  }
}
