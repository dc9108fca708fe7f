import { trialsBehind } from '#shared/claims/trials-behind.ts';
import type { Evidence, ValueReference } from '#shared/evidence/evidence.ts';
import type { ComparedSide } from './compare-editions.ts';
import { compareDefinitions } from './compare-definitions.ts';
import { nameTrials } from './name-trials.ts';

/**
 * Why a value reads otherwise, as far as the trials behind it tell: "B13 added, B11 left out", "B12 corrected";
 * where the trials are the same, "a definition changed". Empty when nothing of the kind can be named.
 */
export function whyMoved(ref: ValueReference, before: ComparedSide, after: ComparedSide): string {
  const was = trialsBehind(before.findings, before.evidence, ref);
  const is = trialsBehind(after.findings, after.evidence, ref);
  const added = is.filter((id) => !was.includes(id));
  const left = was.filter((id) => !is.includes(id));
  const corrected = is.filter((id) => was.includes(id) && !sameReadings(id, before.evidence, after.evidence));
  const named = (ids: readonly string[], evidence: Evidence, what: string) =>
    ids.length === 0 ? [] : [`${nameTrials(ids, evidence)} ${what}`];
  const reasons = [
    ...named(added, after.evidence, 'added'),
    ...named(left, before.evidence, 'left out'),
    ...named(corrected, after.evidence, 'corrected'),
  ];
  if (reasons.length > 0) return reasons.join(', ');
  return compareDefinitions(before.evidence, after.evidence).length > 0 ? 'a definition changed' : '';
}

function sameReadings(id: string, before: Evidence, after: Evidence): boolean {
  const valuesIn = (evidence: Evidence) => evidence.trials.find((trial) => trial.id === id)?.values;
  return JSON.stringify(valuesIn(before)) === JSON.stringify(valuesIn(after));
}
