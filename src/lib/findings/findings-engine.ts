import type { EvidenceStep } from '#shared/contracts/evidence-changes.ts';
import { applyStep } from '#shared/evidence/apply-change.ts';
import { createEvaluationCache, evaluate } from '#shared/evidence/evaluate.ts';
import type { Evidence } from '#shared/evidence/evidence.ts';
import type { Findings } from '#shared/evidence/findings.ts';

/** Evaluates one problem: whole evidence first, then only the steps that follow it. */
export interface FindingsEngine {
  load(evidence: Evidence): Findings | Promise<Findings>;
  follow(steps: readonly EvidenceStep[]): Findings | Promise<Findings>;
}

export function createFindingsEngine(): FindingsEngine {
  const cache = createEvaluationCache();
  let evidence: Evidence | null = null;
  return {
    load(whole) {
      evidence = whole;
      return evaluate(evidence, cache);
    },
    follow(steps) {
      if (!evidence) throw new Error('follow: needs evidence to be loaded first');
      evidence = steps.reduce((held, step) => applyStep(held, step.changes, step.version), evidence);
      return evaluate(evidence, cache);
    },
  };
}
