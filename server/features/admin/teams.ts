import { randomUUID } from 'node:crypto';
import type { Transaction } from 'sequelize';
import type { AdminTeam, createTeam as createTeamEndpoint } from '#shared/contracts/admin.ts';
import type { BodyOf } from '#shared/contracts/endpoint.ts';
import type { Database } from '#server/database/database.ts';
import type { ServerDeps } from '#server/deps.ts';
import { AppError } from '#server/errors/app-error.ts';
import { notFound } from '#server/errors/refusals.ts';
import { writeInvitation } from '#server/features/invitations/service.ts';
import type { Actor } from '#server/middleware/actor.ts';
import type { TeamModel } from '#server/features/teams/service.ts';

type AdminDeps = Pick<ServerDeps, 'database' | 'now' | 'publicAddress' | 'mail'>;

const MAX_TEAMS = 500;

/** Every team by name: who leads it and how many are in it, and nothing of its problems. */
export async function listAllTeams({ database, now }: AdminDeps): Promise<AdminTeam[]> {
  const teams = await database.models.teams.findAll({
    order: [['name', 'ASC']],
    limit: MAX_TEAMS,
    raw: true,
  });
  return Promise.all(teams.map((team) => toAdminTeam(database, team, now())));
}

/** Opens a team and invites its first captain, in one transaction. */
export async function createTeam(
  deps: AdminDeps,
  actor: Actor,
  { name, university, season, captain }: BodyOf<typeof createTeamEndpoint>,
): Promise<AdminTeam> {
  const { database } = deps;
  const team = await database.write(async (transaction) => {
    const row = await database.models.teams.create(
      {
        id: randomUUID(),
        slug: await freeSlug(database, name, transaction),
        name,
        university,
        isDemo: false,
        seasonFrom: season.from,
        seasonTo: season.to,
      },
      { transaction },
    );
    await writeInvitation(deps, row.id, actor, { ...captain, role: 'captain' }, transaction);
    return row;
  });
  void deps.mail.wake();
  return toAdminTeam(database, team, deps.now());
}

/** Invites a captain to a team that has none who may sign in. 404; 409 `has-captain`. */
export async function inviteCaptain(
  deps: AdminDeps,
  actor: Actor,
  slug: string,
  captain: { readonly name: string; readonly email: string },
): Promise<AdminTeam> {
  const { database, now } = deps;
  const team = await database.models.teams.findOne({ where: { slug }, raw: true });
  if (!team) throw notFound('There is no such team.');
  await database.write(async (transaction) => {
    const [first] = await captainsOf(database, team.id, transaction);
    if (first !== undefined) {
      throw new AppError(
        409,
        'has-captain',
        `${first} is captain of ${team.name} and invites everybody else.`,
      );
    }
    await writeInvitation(deps, team.id, actor, { ...captain, role: 'captain' }, transaction);
  });
  void deps.mail.wake();
  return toAdminTeam(database, team, now());
}

async function toAdminTeam(
  database: Database,
  { id, slug, name, university }: TeamModel,
  now: Date,
): Promise<AdminTeam> {
  const { memberships, invitations } = database.models;
  const invited = await invitations.findAll({ where: { teamId: id, role: 'captain' }, raw: true });
  return {
    slug,
    name,
    university,
    people: await memberships.count({ where: { teamId: id } }),
    captains: await captainsOf(database, id, null),
    invited: invited.map((row) => ({
      name: row.name,
      email: row.email,
      isOver: row.expiresAt <= now.toISOString(),
    })),
  };
}

/** Names of the captains who may sign in. */
async function captainsOf(
  database: Database,
  teamId: string,
  transaction: Transaction | null,
): Promise<string[]> {
  const rows = await database.models.memberships.findAll({
    attributes: ['userId'],
    where: { teamId, role: 'captain' },
    raw: true,
    transaction,
  });
  const users = await database.models.users.findAll({
    attributes: ['name'],
    where: { id: rows.map(({ userId }) => userId), disabledAt: null },
    order: [['name', 'ASC']],
    raw: true,
    transaction,
  });
  return users.map(({ name }) => name);
}

const LONGEST_SLUG = 40;

/** The team's name as an address has it, with a number where another team has the same. */
async function freeSlug(database: Database, name: string, transaction: Transaction): Promise<string> {
  const plain = name.normalize('NFKD').replaceAll(/\p{M}/gu, '').toLowerCase();
  const words = plain.replaceAll(/[^a-z0-9]+/g, '-').slice(0, LONGEST_SLUG);
  const base = words.replaceAll(/^-|-$/g, '') || 'team';
  for (let n = 1; ; n += 1) {
    const slug = n === 1 ? base : `${base}-${n}`;
    if ((await database.models.teams.count({ where: { slug }, transaction })) === 0) return slug;
  }
}
