import type { EvidenceStep } from '#shared/contracts/evidence-changes.ts';
import { applyStep } from '#shared/evidence/apply-change.ts';
import { createEvaluationCache, evaluate } from '#shared/evidence/evaluate.ts';
import type { Evidence } from '#shared/evidence/evidence.ts';
import type { Findings } from '#shared/evidence/findings.ts';
import { findLeaks } from '#shared/leaks/find-leaks.ts';
import type { Leak } from '#shared/leaks/leak.ts';
import type { ReportDocument } from '#shared/report/schema/report-node.ts';

/** Evaluates one problem: whole evidence first, then only the steps that follow it. */
export interface FindingsEngine {
  load(evidence: Evidence): Findings | Promise<Findings>;
  follow(steps: readonly EvidenceStep[]): Findings | Promise<Findings>;
  /** Where an opponent will press, with the evidence that it holds and this text. */
  leaks(document: ReportDocument): readonly Leak[] | Promise<readonly Leak[]>;
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
    leaks(document) {
      if (!evidence) throw new Error('leaks: needs evidence to be loaded first');
      return findLeaks({ evidence, findings: evaluate(evidence, cache), document });
    },
  };
}
