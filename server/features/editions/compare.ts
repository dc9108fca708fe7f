import { compareEditions, type ComparedSide } from '#shared/editions/compare-editions.ts';
import type { EditionComparison } from '#shared/editions/edition-comparison.ts';
import { findingsFromJson } from '#shared/evidence/findings-json.ts';
import type { ServerDeps } from '#server/deps.ts';
import { getEvidence } from '#server/features/evidence/service.ts';
import { documentOf } from '#server/features/report/service.ts';
import type { ProblemPlace } from '#server/features/teams/service.ts';
import { getEdition } from './service.ts';

/** What moved from an edition to another one, or to the draft; 404 when either is not there. */
export async function compareWith(
  deps: ServerDeps,
  place: ProblemPlace,
  n: number,
  other: number | 'draft',
): Promise<EditionComparison> {
  const before = await editionSide(deps, place, n);
  const after = other === 'draft' ? await draftSide(deps, place) : await editionSide(deps, place, other);
  return compareEditions(before, after);
}

async function editionSide(deps: ServerDeps, place: ProblemPlace, n: number): Promise<ComparedSide> {
  const { content } = await getEdition(deps.database, place.problem.id, n);
  return { ...content, findings: findingsFromJson(content.findings) };
}

async function draftSide(deps: ServerDeps, { problem }: ProblemPlace): Promise<ComparedSide> {
  const { evidence } = await getEvidence(deps, problem.id);
  const { document } = await documentOf(deps.database, problem.id, deps.now());
  return { evidence, document, findings: await deps.evaluation.getFindings(problem.id, evidence) };
}
