import type { Transaction } from 'sequelize';
import type { Evidence } from '#shared/evidence/evidence.ts';
import { emptyReport } from '#shared/report/schema/empty-report.ts';
import type { Database } from '#server/database/database.ts';
import { hashPassphrase } from '#server/features/account/passphrase.ts';
import { storeEvidence } from '#server/features/evidence/store-evidence.ts';
import { seedReport } from '#server/features/report/service.ts';
import { DEMO_EVENT_ID, demoEvent, demoFights, demoSeason } from './fights.ts';
import { DEMO_PEOPLE } from './people.ts';
import { seedLeaks } from './seed-leaks.ts';
import { seedNotes } from './seed-notes.ts';
import { DEMO_PROBLEMS, DEMO_SETTINGS } from './problems.ts';
import type { DemoProblem } from './problems.ts';
import { seedCopy } from './seed-copy.ts';
import { seedPeople } from './seed-people.ts';
import { seedEditions } from './seed-editions.ts';

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
    await seedPeople(database, firstStart, transaction);
    await seedCopy(database, firstStart, transaction);
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
  const { teams, memberships, fights, events } = database.models;
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
  await events.create(
    { id: DEMO_EVENT_ID, teamId: TEAMS[0].id, content: JSON.stringify(demoEvent()) },
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
      eventId: DEMO_EVENT_ID,
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
  const evidence = problem.work?.evidence(firstStart) ?? evidenceOfTasks(problem, firstStart);
  await problems.create(
    {
      id,
      teamId: TEAMS[0].id,
      number: problem.number,
      title: problem.title,
      statement: problem.statement,
      owners: JSON.stringify(problem.owners),
      settings: JSON.stringify(evidence.settings),
      evidenceVersion: evidence.version,
      createdAt: firstStart.toISOString(),
    },
    { transaction },
  );
  await tasks.bulkCreate(
    problem.tasks.map((task, position) => ({ problemId: id, ...task, position })),
    { transaction },
  );
  await storeEvidence(database, id, evidence, userIdOf, transaction);
  const report = problem.work?.report(evidence) ?? emptyReport();
  await seedReport(database, id, report, firstStart.toISOString(), transaction);
  if (problem.number === 1) {
    await seedLeaks(database, id, { evidence, document: report, at: firstStart.toISOString() }, transaction);
    await seedNotes(database, id, firstStart, transaction);
  }
  const editions = problem.work?.editions?.(firstStart) ?? [];
  await seedEditions(database, { ...problem, id }, TEAMS[0], editions, transaction);
}

/** A problem that nobody has begun: each verb of the task waits as a claim without a test. */
function evidenceOfTasks({ tasks }: DemoProblem, firstStart: Date): Evidence {
  return {
    version: 1,
    settings: DEMO_SETTINGS,
    instruments: [],
    quantities: [],
    series: [],
    trials: [],
    models: [],
    comparisons: [],
    claims: tasks.map(({ id, text }, index) => ({
      id: `claim-${index + 1}`,
      n: index + 1,
      text,
      test: null,
      task: id,
      declaredAt: firstStart.toISOString(),
    })),
    charts: [],
  };
}

function userIdOf(name: string): string {
  const person = DEMO_PEOPLE.find((candidate) => candidate.name === name);
  if (!person) throw new RangeError(`userIdOf: needs a person of the demonstration, got ${name}`);
  return person.id;
}
