import { randomUUID } from 'node:crypto';
import type { Transaction } from 'sequelize';
import type { z } from 'zod';
import type { ProblemSettings } from '#shared/evidence/evidence.ts';
import type { BodyOf } from '#shared/contracts/endpoint.ts';
import type {
  newProblemSchema,
  Person,
  Problem,
  updateProblem as updateProblemEndpoint,
} from '#shared/contracts/teams.ts';
import { AppError } from '#server/errors/app-error.ts';
import { changedMeanwhile, invalid, notFound } from '#server/errors/refusals.ts';
import { commitStep, createFirstStep } from '#server/features/evidence/service.ts';
import type { EvidenceDeps, StepDraft } from '#server/features/evidence/service.ts';
import { listPeople } from '#server/features/teams/service.ts';
import type { ProblemPlace, TeamPlace } from '#server/features/teams/service.ts';
import type { Actor } from '#server/middleware/actor.ts';
import { changeTasks, insertTasks } from './tasks.ts';

export const DEFAULT_SETTINGS: ProblemSettings = { k: 2, rounding: 'two digits', level: 0.95, paper: 'A4' };

/** A problem with its tasks, owners and settings; everybody of its team may ask. */
export async function getProblem(deps: EvidenceDeps, place: ProblemPlace): Promise<Problem> {
  const { problems, tasks } = deps.database.models;
  const row = await problems.findByPk(place.problem.id, { raw: true });
  if (!row) throw notFound();
  const taskRows = await tasks.findAll({
    where: { problemId: row.id },
    order: [['position', 'ASC']],
    raw: true,
  });
  const people = await listPeople(deps.database, place.team.id);
  return {
    number: row.number,
    title: row.title,
    statement: row.statement,
    tasks: taskRows.map(({ id, text }) => ({ id, text })),
    owners: ownersAmong(people, row.owners),
    settings: JSON.parse(row.settings) as ProblemSettings,
    rowVersion: row.rowVersion,
  };
}

/** The people a stored list of owners names, without those who have left the team. */
export function ownersAmong(people: readonly Person[], owners: string): Person[] {
  const ids = JSON.parse(owners) as readonly string[];
  return ids.flatMap((id) => people.find((person) => person.id === id) ?? []);
}

/**
 * A new problem, its tasks, and for each task a claim whose test is not chosen. Captain and members.
 * 409 `number-taken`; 422 when an owner is not of the team.
 */
export async function createProblem(
  deps: EvidenceDeps,
  place: TeamPlace,
  actor: Actor,
  body: z.infer<typeof newProblemSchema>,
): Promise<{ number: number }> {
  const { problems } = deps.database.models;
  await deps.database.write(async (transaction) => {
    await assertOwners(deps, place, body.owners, transaction);
    const taken = await problems.count({
      where: { teamId: place.team.id, number: body.number },
      transaction,
    });
    if (taken > 0) throw numberTaken(body.number);
    const id = randomUUID();
    await problems.create(
      {
        id,
        teamId: place.team.id,
        number: body.number,
        title: body.title,
        statement: body.statement,
        owners: JSON.stringify(body.owners),
        settings: JSON.stringify(DEFAULT_SETTINGS),
        createdAt: deps.now().toISOString(),
      },
      { transaction },
    );
    const problem: ProblemPlace = { ...place, problem: { id, number: body.number } };
    const tasks = body.tasks.map((text) => ({ id: randomUUID(), text }));
    await insertTasks(deps.database, id, tasks, transaction);
    await createFirstStep(deps, problem, actor, tasks, transaction);
  });
  deps.events.publishStale(place, 'problems');
  return { number: body.number };
}

/**
 * Changes what is given; settings and tasks are evidence and raise its version. Captain and members.
 * 409 `changed-meanwhile` when the row is not the version that was changed.
 */
export async function updateProblem(
  deps: EvidenceDeps,
  place: ProblemPlace,
  actor: Actor,
  rowVersion: number,
  body: BodyOf<typeof updateProblemEndpoint>,
): Promise<Problem> {
  const request = { mutationId: randomUUID(), action: 'change the problem' };
  await commitStep(deps, place, actor, request, async (draft) => {
    await changeRow(deps, place, rowVersion, body, draft);
    if (body.tasks) await changeTasks(deps.database, place.problem.id, body.tasks, draft);
  });
  deps.events.publishStale(place, 'problem', place.problem.number);
  deps.events.publishStale(place, 'problems');
  return getProblem(deps, place);
}

async function changeRow(
  deps: EvidenceDeps,
  place: ProblemPlace,
  rowVersion: number,
  body: BodyOf<typeof updateProblemEndpoint>,
  draft: StepDraft,
): Promise<void> {
  const { problems } = deps.database.models;
  const { transaction } = draft;
  if (body.owners) await assertOwners(deps, place, body.owners, transaction);
  const settings = { ...draft.evidence.settings, ...body.settings };
  const [changed] = await problems.update(
    {
      ...(body.title === undefined ? {} : { title: body.title }),
      ...(body.statement === undefined ? {} : { statement: body.statement }),
      ...(body.owners === undefined ? {} : { owners: JSON.stringify(body.owners) }),
      settings: JSON.stringify(settings),
      rowVersion: rowVersion + 1,
    },
    { where: { id: place.problem.id, rowVersion }, transaction },
  );
  if (changed === 0) throw changedMeanwhile();
  if (JSON.stringify(settings) !== JSON.stringify(draft.evidence.settings)) {
    draft.change({ table: 'settings', row: settings }, draft.evidence.settings);
  }
}

async function assertOwners(
  deps: EvidenceDeps,
  place: TeamPlace,
  owners: readonly string[],
  transaction: Transaction,
): Promise<void> {
  const people = await listPeople(deps.database, place.team.id, transaction);
  if (owners.some((id) => !people.some((person) => person.id === id))) {
    throw invalid({ owners: 'Owners are people of the team. Choose them from the list.' });
  }
}

function numberTaken(number: number): AppError {
  const sentence = `The team has a problem ${number} already. Give this one another number.`;
  return new AppError(409, 'number-taken', sentence, { fields: { number: sentence } });
}
