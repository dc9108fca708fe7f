import type { Transaction } from 'sequelize';
import type { Role, Session } from '#shared/contracts/session.ts';
import type { Fight, Person, Team } from '#shared/contracts/teams.ts';
import type { Database } from '#server/database/database.ts';
import { AppError } from '#server/errors/app-error.ts';
import { notFound } from '#server/errors/refusals.ts';
import type { OpenSockets } from '#server/sockets/open-sockets.ts';
import { isAdministrator } from '#server/features/account/service.ts';
import { auditTeam } from './audit-team.ts';
import { toFight } from './model.ts';

export { toFight } from './model.ts';
export type { TeamModel } from './model.ts';
export { auditTeam } from './audit-team.ts';

/** A team as one of its people sees it. */
export interface TeamPlace {
  readonly team: { readonly id: string; readonly slug: string };
  readonly role: Role;
}

/** A problem as one of its team's people sees it. */
export interface ProblemPlace extends TeamPlace {
  readonly problem: { readonly id: string; readonly number: number };
}

/** The team, if this person is in it; null otherwise, as if there were none. */
export async function findTeamPlace(
  database: Database,
  userId: string,
  slug: string,
): Promise<TeamPlace | null> {
  const team = await database.models.teams.findOne({
    attributes: ['id', 'slug'],
    where: { slug },
    raw: true,
  });
  if (!team) return null;
  const membership = await database.models.memberships.findOne({
    attributes: ['role'],
    where: { teamId: team.id, userId },
    raw: true,
  });
  return membership ? { team: { id: team.id, slug: team.slug }, role: membership.role } : null;
}

/** The problem, if this person is in its team; null otherwise. */
export async function findProblemPlace(
  database: Database,
  userId: string,
  slug: string,
  number: number,
): Promise<ProblemPlace | null> {
  const place = await findTeamPlace(database, userId, slug);
  if (!place) return null;
  const problem = await database.models.problems.findOne({
    attributes: ['id', 'number'],
    where: { teamId: place.team.id, number },
    raw: true,
  });
  return problem ? { ...place, problem: { id: problem.id, number: problem.number } } : null;
}

/** The ids of the teams a person is in. */
export async function listTeamIds(database: Database, userId: string): Promise<string[]> {
  const rows = await database.models.memberships.findAll({
    attributes: ['teamId'],
    where: { userId },
    raw: true,
  });
  return rows.map(({ teamId }) => teamId);
}

/** What a signed-in person's session says: who they are, and their role in each of their teams. */
export async function getSession(
  database: Database,
  user: { readonly id: string; readonly name: string; readonly email: string },
): Promise<Session> {
  const memberships = await database.models.memberships.findAll({ where: { userId: user.id }, raw: true });
  const teams = await database.models.teams.findAll({
    where: { id: memberships.map(({ teamId }) => teamId) },
    order: [['name', 'ASC']],
    raw: true,
  });
  const roles = new Map(memberships.map(({ teamId, role }) => [teamId, role]));
  return {
    user: {
      id: user.id,
      name: user.name,
      email: user.email,
      ...((await isAdministrator(database, user.id)) ? { isAdministrator: true as const } : {}),
    },
    teams: teams.flatMap(({ id, slug, name, university }) => {
      const role = roles.get(id);
      return role ? [{ slug, name, university, role }] : [];
    }),
  };
}

/** The team's people in their order. */
export async function listPeople(
  database: Database,
  teamId: string,
  transaction: Transaction | null = null,
): Promise<Person[]> {
  const memberships = await database.models.memberships.findAll({
    where: { teamId },
    order: [['position', 'ASC']],
    raw: true,
    transaction,
  });
  const users = await database.models.users.findAll({
    attributes: ['id', 'name'],
    where: { id: memberships.map(({ userId }) => userId) },
    raw: true,
    transaction,
  });
  const names = new Map(users.map(({ id, name }) => [id, name]));
  return memberships.map(({ userId, role }) => ({ id: userId, name: names.get(userId) ?? '', role }));
}

/** The team's fights, the earliest first. */
export async function listFights(database: Database, teamId: string): Promise<Fight[]> {
  const rows = await database.models.fights.findAll({ where: { teamId }, order: [['at', 'ASC']], raw: true });
  return rows.map(toFight);
}

/** A team with its people and fights; any of its people may ask. */
export async function getTeam(database: Database, place: TeamPlace): Promise<Team> {
  const team = await database.models.teams.findByPk(place.team.id, { raw: true });
  if (!team) throw notFound();
  return {
    slug: team.slug,
    name: team.name,
    university: team.university,
    isDemo: Boolean(team.isDemo),
    people: await listPeople(database, team.id),
    season: { from: team.seasonFrom, to: team.seasonTo },
    fights: await listFights(database, team.id),
  };
}

/**
 * Gives a person of the team another role; the captain may. Their open sockets end and come back with the new role.
 * 404 for who is not in the team; 409 `last-captain`.
 */
export async function changeRole(
  deps: { readonly database: Database; readonly sockets: OpenSockets; readonly now: () => Date },
  place: TeamPlace,
  change: { readonly by: string; readonly person: string; readonly role: Role },
): Promise<Person> {
  const { memberships } = deps.database.models;
  const person = await deps.database.write(async (transaction) => {
    const people = await listPeople(deps.database, place.team.id, transaction);
    const found = people.find(({ id }) => id === change.person);
    if (!found) throw notFound('Nobody of this team is meant by this address.');
    const captains = people.filter(({ role }) => role === 'captain');
    if (found.role === 'captain' && change.role !== 'captain' && captains.length === 1) {
      throw new AppError(
        409,
        'last-captain',
        `${found.name} is the only captain. Make somebody else captain first.`,
      );
    }
    const where = { teamId: place.team.id, userId: found.id };
    await memberships.update({ role: change.role }, { where, transaction });
    await auditTeam(
      deps.database,
      {
        teamId: place.team.id,
        by: change.by,
        now: deps.now(),
        action: 'change role',
        before: { table: 'memberships', id: found.id, role: found.role },
        after: { table: 'memberships', id: found.id, role: change.role },
      },
      transaction,
    );
    return { ...found, role: change.role };
  });
  deps.sockets.closePerson(person.id);
  return person;
}
