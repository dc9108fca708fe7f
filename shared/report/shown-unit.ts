import type { ValueReference } from '#shared/evidence/evidence.ts';
import { fault } from '#shared/evidence/fault.ts';
import type { Fault, Scalar } from '#shared/evidence/findings.ts';
import { formatDimension, sameDimension } from '#shared/units/dimension.ts';
import { parseUnit } from '#shared/units/parse-unit.ts';

/**
 * The unit a value is shown in: the one asked for, else that of the register. A difference of temperatures in °C is
 * shown in K, since its zero is no temperature.
 *
 * @param asked - null: the register's
 * @returns the unit's text, or why the value cannot be shown in it
 */
export function shownUnit(ref: ValueReference, scalar: Scalar, asked: string | null): string | Fault {
  const own = parseUnit(scalar.unit);
  if (!own.ok) return fault('unknown unit', own.sentence, rowOf(ref));
  const chosen = asked === null ? own : parseUnit(asked);
  if (!chosen.ok) return fault('unknown unit', chosen.sentence, rowOf(ref));
  if (!sameDimension(chosen.unit.dimension, own.unit.dimension)) {
    const is = formatDimension(own.unit.dimension);
    return fault(
      'dimension mismatch',
      `It cannot be shown in ${chosen.unit.text}: its own unit is ${scalar.unit}${is === '' ? '' : ` (${is})`}. Choose another unit.`,
      rowOf(ref),
    );
  }
  const isDifference = ref.kind === 'difference' || (ref.kind === 'claim' && ref.figure === 'difference');
  return isDifference && chosen.unit.offset !== undefined ? 'K' : (asked ?? scalar.unit);
}

function rowOf(ref: ValueReference): string {
  switch (ref.kind) {
    case 'quantity':
    case 'mean':
    case 'prediction':
    case 'reading':
      return ref.quantity;
    case 'fit':
      return ref.comparison;
    case 'claim':
      return ref.claim;
    case 'count':
      return ref.series ?? ref.comparison ?? '';
    case 'difference':
      return rowOf(ref.a);
  }
}
