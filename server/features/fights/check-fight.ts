import type { Transaction } from 'sequelize';
import type { FightInput, KeptEvent } from '#shared/contracts/fights.ts';
import type { Person } from '#shared/contracts/teams.ts';
import type { Database } from '#server/database/database.ts';
import { invalid } from '#server/errors/refusals.ts';
import { listPeople } from '#server/features/teams/service.ts';
import { toKeptEvent } from './model.ts';

/** Refuses what is not the team's, and what the fight's event does not allow. */
export async function checkFight(
  database: Database,
  teamId: string,
  fight: FightInput,
  transaction: Transaction,
): Promise<void> {
  const rows = await database.models.problems.findAll({
    attributes: ['number'],
    where: { teamId },
    raw: true,
    transaction,
  });
  const numbers = new Set(rows.map(({ number }) => number));
  const people = await listPeople(database, teamId, transaction);
  for (const [index, { problem, person }] of fight.stages.entries()) {
    if (!numbers.has(problem)) {
      throw invalid({ [`stages.${index}.problem`]: `The team has no problem ${problem}. Begin it first.` });
    }
    if (person !== undefined) checkPerson(people, person, index);
  }
  if (fight.event === undefined) return;
  const where = { id: fight.event, teamId };
  const event = await database.models.events.findOne({ where, raw: true, transaction });
  if (!event) throw invalid({ event: 'The team has no such event. Choose one of its events.' });
  checkRules(fight, toKeptEvent(event), people);
}

function checkPerson(people: readonly Person[], person: string, index: number): void {
  const found = people.find(({ id }) => id === person);
  const field = `stages.${index}.person`;
  if (!found) throw invalid({ [field]: 'Who takes the stage is not of this team.' });
  if (found.role === 'advisor') {
    throw invalid({ [field]: `${found.name} is an advisor. The captain or a member takes the stage.` });
  }
}

function checkRules(fight: FightInput, event: KeptEvent, people: readonly Person[]): void {
  const times = new Map<string, number>();
  for (const [index, { role, person }] of fight.stages.entries()) {
    if (!event.roles.includes(role)) {
      throw invalid({ [`stages.${index}.role`]: `In ${event.name} nobody has to ${role}.` });
    }
    if (person === undefined) continue;
    const count = (times.get(person) ?? 0) + 1;
    times.set(person, count);
    const limit = event.rules.stagesPerPerson;
    if (count > limit) {
      const name = people.find(({ id }) => id === person)?.name ?? 'This person';
      const often = limit === 1 ? 'once' : limit === 2 ? 'twice' : `${limit} times`;
      throw invalid({
        [`stages.${index}.person`]: `${name} would take the stage ${count} times; ${event.name} allows it ${often} in a fight. Choose somebody else.`,
      });
    }
  }
}
