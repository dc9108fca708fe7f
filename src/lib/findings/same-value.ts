import type { Fault, Scalar } from '#shared/evidence/findings.ts';

/** Whether two values would be shown alike in every form, card included. */
export function sameValue(a: Scalar | Fault | null, b: Scalar | Fault | null): boolean {
  if (a === b) return true;
  if (!a || !b || a.shape !== b.shape) return false;
  if (a.shape === 'fault' || b.shape === 'fault') {
    return a.shape === 'fault' && b.shape === 'fault' && a.sentence === b.sentence && a.at === b.at;
  }
  return (
    a.value === b.value &&
    a.u === b.u &&
    a.unit === b.unit &&
    a.hue === b.hue &&
    a.degreesOfFreedom === b.degreesOfFreedom &&
    JSON.stringify(a.madeOf) === JSON.stringify(b.madeOf)
  );
}
