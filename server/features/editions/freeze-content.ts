import {
  EDITION_SCHEMA_VERSION,
  frozenEditionSchema,
  type FrozenEdition,
  type NamedPerson,
} from '#shared/editions/frozen-edition.ts';
import { findingsToJson } from '#shared/evidence/findings-json.ts';
import { plateFingerprints } from '#shared/report/plate-fingerprints.ts';
import type { ServerDeps } from '#server/deps.ts';
import { getEvidence } from '#server/features/evidence/service.ts';
import { listPictures } from '#server/features/files/service.ts';
import { getProblem } from '#server/features/problems/service.ts';
import { documentOf } from '#server/features/report/service.ts';
import { getTeam, type ProblemPlace } from '#server/features/teams/service.ts';

/** The draft as it stands, in the form an edition keeps: what is acknowledged to its writers is in it. */
export async function freezeContent(deps: ServerDeps, place: ProblemPlace): Promise<FrozenEdition> {
  const at = deps.now();
  const { evidence } = await getEvidence(deps, place.problem.id);
  const [problem, team, report, findings] = await Promise.all([
    getProblem(deps, place),
    getTeam(deps.database, place),
    documentOf(deps.database, place.problem.id, at),
    deps.evaluation.getFindings(place.problem.id, evidence),
  ]);
  const { number, title, statement, tasks, owners } = problem;
  const { name, university, isDemo, people } = team;
  return frozenEditionSchema.parse({
    schemaVersion: EDITION_SCHEMA_VERSION,
    reportSchema: report.schemaVersion,
    problem: { number, title, statement, tasks, owners: owners.map(named) },
    team: { name, university, isDemo, people: people.map(named) },
    evidence,
    document: report.document,
    findings: findingsToJson(findings),
    files: await listPictures(deps.database, place.problem.id, plateFingerprints(report.document)),
    at: at.toISOString(),
  });
}

function named({ name, role }: NamedPerson): NamedPerson {
  return { name, role };
}
