import { randomUUID } from 'node:crypto';
import type { Transaction } from 'sequelize';
import type { FightInput, KeptEvent, KeptFight } from '#shared/contracts/fights.ts';
import type { Event } from '#shared/talk/event.ts';
import type { Database } from '#server/database/database.ts';
import { AppError } from '#server/errors/app-error.ts';
import { changedMeanwhile, notFound } from '#server/errors/refusals.ts';
import type { TeamPlace } from '#server/features/teams/service.ts';
import { checkFight } from './check-fight.ts';
import { toKeptEvent, toKeptFight } from './model.ts';

/** Who changes a team's fights or events, and in which team. */
export interface Change {
  readonly database: Database;
  readonly now: () => Date;
  readonly place: TeamPlace;
  readonly by: string;
}

/** The team's fights, the earliest first. */
export async function listKeptFights(database: Database, teamId: string): Promise<KeptFight[]> {
  const rows = await database.models.fights.findAll({ where: { teamId }, order: [['at', 'ASC']], raw: true });
  return rows.map(toKeptFight);
}

/** The team's events by name. */
export async function listEvents(database: Database, teamId: string): Promise<KeptEvent[]> {
  const rows = await database.models.events.findAll({ where: { teamId }, raw: true });
  return rows.map(toKeptEvent).toSorted((a, b) => (a.name < b.name ? -1 : 1));
}

/** Adds a fight, or with `kept` changes the one that stands; 404, 409 `changed-meanwhile`, 422 for what is not allowed. */
export function writeFight(
  change: Change,
  input: FightInput,
  kept: { readonly id: string; readonly rowVersion: number } | null,
): Promise<KeptFight> {
  const { fights } = change.database.models;
  const content = {
    name: input.name,
    at: new Date(input.at).toISOString(),
    place: input.place || null,
    result: input.result || null,
    eventId: input.event ?? null,
    stages: JSON.stringify(input.stages),
  };
  return change.database.write(async (transaction) => {
    const teamId = change.place.team.id;
    const before = kept && (await standing(change, 'fights', kept, transaction));
    await checkFight(change.database, teamId, input, transaction);
    const id = kept?.id ?? randomUUID();
    const rowVersion = (kept?.rowVersion ?? 0) + 1;
    if (kept) await fights.update({ ...content, rowVersion }, { where: { id, teamId }, transaction });
    else await fights.create({ id, teamId, rowVersion, ...content }, { transaction });
    const row = await fights.findOne({ where: { id, teamId }, raw: true, transaction });
    if (!row) throw notFound();
    await audit(
      change,
      kept ? 'change fight' : 'add fight',
      before,
      { table: 'fights', ...row },
      transaction,
    );
    return toKeptFight(row);
  });
}

/** Adds an event, or with `kept` changes the one that stands; 404, 409 `changed-meanwhile`. */
export function writeEvent(
  change: Change,
  event: Event,
  kept: { readonly id: string; readonly rowVersion: number } | null,
): Promise<KeptEvent> {
  const { events } = change.database.models;
  return change.database.write(async (transaction) => {
    const teamId = change.place.team.id;
    const before = kept && (await standing(change, 'events', kept, transaction));
    const id = kept?.id ?? randomUUID();
    const rowVersion = (kept?.rowVersion ?? 0) + 1;
    const content = JSON.stringify(event);
    if (kept) await events.update({ content, rowVersion }, { where: { id, teamId }, transaction });
    else await events.create({ id, teamId, content, rowVersion }, { transaction });
    const after = { table: 'events', id, teamId, content, rowVersion };
    await audit(change, kept ? 'change event' : 'add event', before, after, transaction);
    return { ...event, id, rowVersion };
  });
}

/** Removes a fight or an event; 409 `event-in-use` for an event by which a fight is held. */
export async function removeRow(
  change: Change,
  table: 'fights' | 'events',
  kept: { readonly id: string; readonly rowVersion: number },
): Promise<void> {
  const { fights, events } = change.database.models;
  const where = { id: kept.id, teamId: change.place.team.id };
  await change.database.write(async (transaction) => {
    const before = await standing(change, table, kept, transaction);
    if (table === 'events') {
      const held = { eventId: kept.id, teamId: where.teamId };
      const fight = await fights.findOne({ where: held, raw: true, transaction });
      if (fight) {
        throw new AppError(
          409,
          'event-in-use',
          `${fight.name} is held by this event. Give it another event first.`,
        );
      }
      await events.destroy({ where, transaction });
    } else {
      await fights.destroy({ where, transaction });
    }
    await audit(change, table === 'events' ? 'remove event' : 'remove fight', before, null, transaction);
  });
}

async function standing(
  { database, place }: Change,
  table: 'fights' | 'events',
  kept: { readonly id: string; readonly rowVersion: number },
  transaction: Transaction,
): Promise<object> {
  const query = { where: { id: kept.id, teamId: place.team.id }, raw: true, transaction } as const;
  const row =
    table === 'fights'
      ? await database.models.fights.findOne(query)
      : await database.models.events.findOne(query);
  if (!row) throw notFound();
  if (row.rowVersion !== kept.rowVersion) throw changedMeanwhile();
  return { table, ...row };
}

async function audit(
  { database, now, place, by }: Change,
  action: string,
  before: object | null,
  after: object | null,
  transaction: Transaction,
): Promise<void> {
  await database.models.auditEvents.create(
    {
      teamId: place.team.id,
      problemId: null,
      version: null,
      mutationId: null,
      userId: by,
      at: now().toISOString(),
      action,
      before: JSON.stringify(before ? [before] : []),
      changes: JSON.stringify(after ? [after] : []),
    },
    { transaction },
  );
}
