import type { Transaction } from 'sequelize';
import type { Database } from '#server/database/database.ts';
import { hashPassphrase } from '#server/features/account/passphrase.ts';
import { storeEvidence } from '#server/features/evidence/store-evidence.ts';
import { demoFights, demoSeason } from './fights.ts';
import { DEMO_PEOPLE } from './people.ts';
import { DEMO_PROBLEMS } from './problems.ts';
import type { DemoProblem } from './problems.ts';

const TEAMS = [
  { id: 'demo-tern-rock', slug: 'tern-rock', name: 'Tern Rock', university: 'Skerry University' },
  { id: 'demo-gannet-bank', slug: 'gannet-bank', name: 'Gannet Bank', university: 'Gannet College' },
] as const;

/** Loads the invented demonstration into an empty installation, dated from this first start. Later starts change nothing. */
export async function seedDemo(database: Database, firstStart: Date): Promise<void> {
  if ((await database.models.teams.count()) > 0) return;
  const hashes = new Map(
    await Promise.all(
      DEMO_PEOPLE.map(async ({ id, passphrase }) => [id, await hashPassphrase(passphrase)] as const),
    ),
  );
  await database.write(async (transaction) => {
    await insertPeople(database, hashes, firstStart, transaction);
    await insertTeams(database, firstStart, transaction);
    for (const problem of DEMO_PROBLEMS) await insertProblem(database, problem, firstStart, transaction);
  });
}

async function insertPeople(
  database: Database,
  hashes: ReadonlyMap<string, string>,
  firstStart: Date,
  transaction: Transaction,
): Promise<void> {
  await database.models.users.bulkCreate(
    DEMO_PEOPLE.map(({ id, email, name }) => ({
      id,
      email,
      name,
      passphraseHash: hashes.get(id) ?? '',
      createdAt: firstStart.toISOString(),
    })),
    { transaction },
  );
}

async function insertTeams(database: Database, firstStart: Date, transaction: Transaction): Promise<void> {
  const { teams, memberships, fights } = database.models;
  const { from, to } = demoSeason(firstStart);
  await teams.bulkCreate(
    TEAMS.map((team) => ({ ...team, isDemo: true, seasonFrom: from, seasonTo: to })),
    { transaction },
  );
  await memberships.bulkCreate(
    DEMO_PEOPLE.map(({ id, team, role }, position) => ({
      teamId: `demo-${team}`,
      userId: id,
      role,
      position,
    })),
    { transaction },
  );
  await fights.bulkCreate(
    demoFights(firstStart).map((fight) => ({
      id: fight.id,
      teamId: TEAMS[0].id,
      name: fight.name,
      at: fight.at,
      place: fight.place ?? null,
      result: fight.result ?? null,
      stages: JSON.stringify(fight.stages),
    })),
    { transaction },
  );
}

async function insertProblem(
  database: Database,
  problem: DemoProblem,
  firstStart: Date,
  transaction: Transaction,
): Promise<void> {
  const { problems, tasks } = database.models;
  const id = `demo-problem-${problem.number}`;
  const evidence = problem.evidence?.(firstStart) ?? null;
  await problems.create(
    {
      id,
      teamId: TEAMS[0].id,
      number: problem.number,
      title: problem.title,
      statement: problem.statement,
      owners: JSON.stringify(problem.owners),
      settings: JSON.stringify(evidence?.settings ?? problem.settings),
      evidenceVersion: evidence?.version ?? 0,
      createdAt: firstStart.toISOString(),
    },
    { transaction },
  );
  await tasks.bulkCreate(
    problem.tasks.map((task, position) => ({ problemId: id, ...task, position })),
    { transaction },
  );
  if (evidence) await storeEvidence(database, id, evidence, userIdOf, transaction);
}

function userIdOf(name: string): string {
  const person = DEMO_PEOPLE.find((candidate) => candidate.name === name);
  if (!person) throw new RangeError(`userIdOf: needs a person of the demonstration, got ${name}`);
  return person.id;
}
