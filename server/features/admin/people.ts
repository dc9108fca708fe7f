import type { AdminPerson } from '#shared/contracts/admin.ts';
import type { Database } from '#server/database/database.ts';
import type { ServerDeps } from '#server/deps.ts';
import { AppError } from '#server/errors/app-error.ts';
import { notFound } from '#server/errors/refusals.ts';
import type { UserModel } from '#server/features/account/service.ts';
import type { Actor } from '#server/middleware/actor.ts';

const MAX_PEOPLE = 2000;

/** Every account by name. */
export async function listAllPeople(database: Database): Promise<AdminPerson[]> {
  const rows = await database.models.users.findAll({
    order: [
      ['name', 'ASC'],
      ['id', 'ASC'],
    ],
    limit: MAX_PEOPLE,
    raw: true,
  });
  const teams = await teamsByUser(database);
  return rows.map((row) => toAdminPerson(row, teams.get(row.id) ?? []));
}

/** Locks an account, so that its sessions and sockets end and no link of it opens anything; or opens it again. */
export async function changePerson(
  { database, sockets, now }: Pick<ServerDeps, 'database' | 'sockets' | 'now'>,
  actor: Actor,
  id: string,
  { isDisabled }: { readonly isDisabled: boolean },
): Promise<AdminPerson> {
  if (id === actor.id) {
    throw new AppError(409, 'oneself', 'Your own account looks after the installation and stays open.');
  }
  const { users, sessions, tokens } = database.models;
  const user = await database.write(async (transaction) => {
    const row = await users.findByPk(id, { transaction });
    if (!row) throw notFound('There is no such account.');
    await row.update({ disabledAt: isDisabled ? now().toISOString() : null }, { transaction });
    if (isDisabled) {
      await sessions.destroy({ where: { userId: id }, transaction });
      await tokens.destroy({ where: { userId: id }, transaction });
    }
    return row;
  });
  if (isDisabled) sockets.signOutPerson(id);
  return toAdminPerson(user, (await teamsByUser(database)).get(id) ?? []);
}

async function teamsByUser(database: Database): Promise<Map<string, string[]>> {
  const teams = await database.models.teams.findAll({
    attributes: ['id', 'name'],
    order: [['name', 'ASC']],
    raw: true,
  });
  const memberships = await database.models.memberships.findAll({
    attributes: ['teamId', 'userId'],
    raw: true,
  });
  const found = new Map<string, string[]>();
  for (const { id, name } of teams) {
    for (const { userId } of memberships.filter(({ teamId }) => teamId === id)) {
      found.set(userId, [...(found.get(userId) ?? []), name]);
    }
  }
  return found;
}

function toAdminPerson(
  { id, name, email, isAdministrator, disabledAt }: UserModel,
  teams: readonly string[],
): AdminPerson {
  return {
    id,
    name,
    email,
    teams: [...teams],
    isAdministrator: Boolean(isAdministrator),
    isDisabled: disabledAt !== null,
  };
}
