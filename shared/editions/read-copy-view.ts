/** A copy's view in the shapes that everything which draws a report takes. */
import type { Evidence } from '#shared/evidence/evidence.ts';
import type { Findings } from '#shared/evidence/findings.ts';
import { findingsFromJson } from '#shared/evidence/findings-json.ts';
import type { CopyView } from './copy-view.ts';

/** The same shapes as evidence has everywhere else, with nothing where a copy has nothing. */
export function evidenceOfCopy({ evidence }: CopyView): Evidence {
  return {
    ...evidence,
    trials: evidence.trials.map(({ on, excluded, ...trial }) => ({
      ...trial,
      by: '',
      at: `${on}T00:00:00.000Z`,
      ...(excluded === undefined ? {} : { excluded: { ...excluded, by: '', at: '' } }),
    })),
    models: evidence.models.map((model) => ({ ...model, assumptions: [], at: '', by: '' })),
    claims: evidence.claims.map((claim) => ({ ...claim, declaredAt: '' })),
  };
}

/** Findings of a copy, as everything that draws a report takes them. */
export function findingsOfCopy({ findings }: CopyView): Findings {
  return { ...findingsFromJson(findings), counts: findings.counts };
}
