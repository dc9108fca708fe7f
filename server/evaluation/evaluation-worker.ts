/** Runs in a thread of the pool: the same evaluate() as in the browser, with a cache for each problem it has seen. */
import { createEvaluationCache, evaluate } from '#shared/evidence/evaluate.ts';
import type { EvaluationCache } from '#shared/evidence/evaluate.ts';
import type { Evidence } from '#shared/evidence/evidence.ts';
import type { Findings } from '#shared/evidence/findings.ts';

export interface EvaluationTask {
  readonly problemId: string;
  readonly evidence: Evidence;
}

const MAX_CACHES = 8;
const caches = new Map<string, EvaluationCache>();

export function evaluateInWorker({ problemId, evidence }: EvaluationTask): Findings {
  const cache = caches.get(problemId) ?? createEvaluationCache();
  caches.delete(problemId);
  caches.set(problemId, cache);
  for (const oldest of caches.keys()) {
    if (caches.size <= MAX_CACHES) break;
    caches.delete(oldest);
  }
  return evaluate(evidence, cache);
}
