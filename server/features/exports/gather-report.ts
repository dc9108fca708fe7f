import type { ReportDocument, ReportNode } from '#shared/report/schema/report-node.ts';
import type { ServerDeps } from '#server/deps.ts';
import { findPicture } from '#server/features/files/service.ts';
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
    plates: await readPlates(deps, place, document),
    draft: true,
    at: deps.now().toISOString(),
  };
}

async function readPlates(
  deps: ServerDeps,
  place: ProblemPlace,
  document: ReportDocument,
): Promise<Map<string, Uint8Array>> {
  const plates = new Map<string, Uint8Array>();
  for (const sha of plateFingerprints(document)) {
    const bytes = await findPicture(deps, place.problem.id, sha);
    if (bytes) plates.set(sha, bytes);
  }
  return plates;
}

/** Fingerprints of the report's pictures, each once. */
function plateFingerprints(document: ReportDocument): string[] {
  const found = new Set<string>();
  const visit = (node: ReportNode): void => {
    if (node.type === 'plate') found.add(node.attrs.sha);
    if ('content' in node) (node.content ?? []).forEach(visit);
  };
  visit(document);
  return [...found];
}
