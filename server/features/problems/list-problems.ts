import type { Fight, ProblemSummary } from '#shared/contracts/teams.ts';
import type { ServerDeps } from '#server/deps.ts';
import { getEvidence } from '#server/features/evidence/service.ts';
import { documentOf } from '#server/features/report/service.ts';
import { listFights, listPeople } from '#server/features/teams/service.ts';
import type { TeamPlace } from '#server/features/teams/service.ts';
import { ownersAmong } from './service.ts';
import { summariseProblem } from './summarise-problem.ts';

/** The team's problems by number, each with how far it has come. */
export async function listProblems(deps: ServerDeps, place: TeamPlace): Promise<ProblemSummary[]> {
  const { database } = deps;
  const rows = await database.models.problems.findAll({
    where: { teamId: place.team.id },
    order: [['number', 'ASC']],
    limit: 100,
    raw: true,
  });
  const people = await listPeople(database, place.team.id);
  const next = nextFight(await listFights(database, place.team.id), deps.now());
  return Promise.all(
    rows.map(async (row) => {
      const { evidence } = await getEvidence(deps, row.id);
      const { document } = await documentOf(database, row.id, deps.now());
      const findings = await deps.evaluation.getFindings(row.id, evidence);
      return {
        number: row.number,
        title: row.title,
        statement: row.statement,
        owners: ownersAmong(people, row.owners),
        stage: next?.stages.find(({ problem }) => problem === row.number)?.role ?? null,
        ...summariseProblem(document, evidence, findings),
      };
    }),
  );
}

function nextFight(fights: readonly Fight[], now: Date): Fight | undefined {
  return fights.find(({ at }) => new Date(at) > now);
}
