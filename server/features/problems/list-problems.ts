import type { Fight, ProblemSummary } from '#shared/contracts/teams.ts';
import { sectionNameSchema } from '#shared/contracts/teams.ts';
import { getEvidence } from '#server/features/evidence/service.ts';
import type { EvidenceDeps } from '#server/features/evidence/service.ts';
import { listFights, listPeople } from '#server/features/teams/service.ts';
import type { TeamPlace } from '#server/features/teams/service.ts';
import { ownersAmong } from './service.ts';

/** The team's problems by number, each with how far it has come. */
export async function listProblems(deps: EvidenceDeps, place: TeamPlace): Promise<ProblemSummary[]> {
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
      return {
        number: row.number,
        title: row.title,
        statement: row.statement,
        owners: ownersAmong(people, row.owners),
        stage: next?.stages.find(({ problem }) => problem === row.number)?.role ?? null,
        levels: sectionNameSchema.options.map((section) => ({ section, level: 'Blank' as const })),
        claims: { holds: 0, leaks: 0, undecided: evidence.claims.length },
        trials: evidence.trials.filter(({ withdrawn }) => !withdrawn).length,
        notTied: 0,
      };
    }),
  );
}

function nextFight(fights: readonly Fight[], now: Date): Fight | undefined {
  return fights.find(({ at }) => new Date(at) > now);
}
