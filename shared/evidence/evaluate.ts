import type { Evidence } from './evidence.ts';
import type { Findings } from './findings.ts';

/** What one evaluation leaves for the next, so that only what changed is computed anew. Keep one for each problem. */
export interface EvaluationCache {
  readonly nodes: Map<string, unknown>;
}

/** An empty cache. */
export function createEvaluationCache(): EvaluationCache {
  return { nodes: new Map() };
}

/**
 * Every number, curve and verdict of a problem. The same evidence gives the same findings, with or without a
 * cache; a cache only saves time.
 */
export function evaluate(_evidence: Evidence, _cache?: EvaluationCache): Findings {
  throw new Error('evaluate: body follows');
}
