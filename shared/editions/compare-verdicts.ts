import type { ComparedSide } from './compare-editions.ts';
import type { MovedVerdict } from './edition-comparison.ts';

/** Claims that stand on both sides with another verdict, in the order of their numbers. */
export function compareVerdicts(before: ComparedSide, after: ComparedSide): MovedVerdict[] {
  return after.evidence.claims.flatMap(({ id, n, text }) => {
    const was = before.findings.claims.get(id);
    const is = after.findings.claims.get(id);
    if (was === undefined || is === undefined || was.verdict === is.verdict) return [];
    return [{ n, text, before: was.verdict, after: is.verdict, short: is.short }];
  });
}
