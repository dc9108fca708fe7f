import { plateFingerprints } from '#shared/report/plate-fingerprints.ts';
import type { ServerDeps } from '#server/deps.ts';
import { readPictures } from '#server/features/files/service.ts';
import { getEvidence } from '#server/features/evidence/service.ts';
import { getProblem } from '#server/features/problems/service.ts';
import { documentOf } from '#server/features/report/service.ts';
import { getTeam, type ProblemPlace } from '#server/features/teams/service.ts';
import type { ReportPdfInput } from '#server/rendering/report-pdf.ts';

/** Everything the report is printed from, of one version of the evidence. */
export async function gatherReport(deps: ServerDeps, place: ProblemPlace): Promise<ReportPdfInput> {
  const { evidence } = await getEvidence(deps, place.problem.id);
  const [problem, team, { document }, findings] = await Promise.all([
    getProblem(deps, place),
    getTeam(deps.database, place),
    documentOf(deps.database, place.problem.id, deps.now()),
    deps.evaluation.getFindings(place.problem.id, evidence),
  ]);
  return {
    problem,
    team,
    document,
    evidence,
    findings,
    plates: await readPictures(deps, place.problem.id, plateFingerprints(document)),
    edition: null,
    at: deps.now().toISOString(),
  };
}
