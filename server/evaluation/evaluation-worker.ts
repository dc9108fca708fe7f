/** Runs in a thread of the pool: the same evaluate() as in the browser. */
import { evaluate } from '#shared/evidence/evaluate.ts';
import type { Evidence } from '#shared/evidence/evidence.ts';
import type { Findings } from '#shared/evidence/findings.ts';

export function evaluateInWorker(evidence: Evidence): Findings {
  return evaluate(evidence);
}
