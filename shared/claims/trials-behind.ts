import type { Evidence, ValueReference } from '#shared/evidence/evidence.ts';
import type { Findings, Scalar } from '#shared/evidence/findings.ts';
import { findValue } from '#shared/evidence/find-value.ts';

/** Kept trials that stand behind a value, through everything it is made from; each once. */
export function trialsBehind(findings: Findings, evidence: Evidence, ref: ValueReference): readonly string[] {
  const trials = new Set<string>();
  const seen = new Set<string>();

  function follow(next: ValueReference): void {
    const key = JSON.stringify(next);
    if (seen.has(key)) return;
    seen.add(key);
    const value = findValue(findings, evidence, next);
    if (value.shape === 'fault') return;
    if (next.kind === 'reading') trials.add(next.trial);
    else collect(value);
  }

  function collect({ madeOf }: Scalar): void {
    switch (madeOf.kind) {
      case 'mean':
      case 'summary':
      case 'count':
        for (const id of madeOf.trials) trials.add(id);
        return;
      case 'fit':
        for (const id of findings.comparisons.get(madeOf.comparison)?.used ?? []) trials.add(id);
        return;
      case 'expression':
      case 'difference':
        madeOf.refs.forEach(follow);
        return;
      case 'entered':
    }
  }

  follow(ref);
  return [...trials];
}
