import { randomUUID } from 'node:crypto';
import type { Transaction } from 'sequelize';
import type { Invitation } from '#shared/contracts/people.ts';
import type { Role } from '#shared/contracts/session.ts';
import type { Database } from '#server/database/database.ts';
import type { ServerDeps } from '#server/deps.ts';
import { AppError } from '#server/errors/app-error.ts';
import { notFound } from '#server/errors/refusals.ts';
import { auditTeam } from '#server/features/teams/service.ts';
import { composeMail } from '#server/mail/compose-mail.ts';
import { dropFromOutbox, putInOutbox } from '#server/mail/outbox.ts';
import { expiryOf, sayUtc } from '#server/tokens/expiry.ts';
import { hashSecretToken, newSecretToken } from '#server/tokens/secret-token.ts';
import type { InvitationModel } from './model.ts';

export type InvitationDeps = Pick<ServerDeps, 'database' | 'now' | 'publicAddress'>;

export interface Invited {
  readonly name: string;
  readonly email: string;
  readonly role: Role;
}

interface Inviter {
  readonly id: string;
  readonly name: string;
}

const MAX_WAITING = 60;
const ROLE_WORDS: Readonly<Record<Role, string>> = {
  captain: 'its captain',
  member: 'a member',
  advisor: 'an advisor',
};

/** The team's invitations that nobody has accepted, the newest first. */
export async function listInvitations(
  { database, now }: InvitationDeps,
  teamId: string,
): Promise<Invitation[]> {
  const { invitations, users } = database.models;
  const rows = await invitations.findAll({ where: { teamId }, order: [['invitedAt', 'DESC']], raw: true });
  const inviters = await users.findAll({
    attributes: ['id', 'name'],
    where: { id: rows.map(({ invitedBy }) => invitedBy) },
    raw: true,
  });
  const names = new Map(inviters.map(({ id, name }) => [id, name]));
  return rows.map((row) => toInvitation(row, names.get(row.invitedBy) ?? '', now()));
}

/**
 * Writes an invitation and its mail; call inside a write, and wake the delivery afterwards. An earlier invitation to
 * the same address ends. 409 `in-the-team`, `too-many-invitations`.
 */
export async function writeInvitation(
  deps: InvitationDeps,
  teamId: string,
  by: Inviter,
  invited: Invited,
  transaction: Transaction,
): Promise<Invitation> {
  const { database, now } = deps;
  await assertNotInTeam(database, teamId, invited, transaction);
  const earlier = await database.models.invitations.findAll({
    where: { teamId, email: invited.email },
    transaction,
  });
  for (const row of earlier) await end(database, row, 'A newer invitation took its place.', transaction);
  if ((await database.models.invitations.count({ where: { teamId }, transaction })) >= MAX_WAITING) {
    throw new AppError(
      409,
      'too-many-invitations',
      `${MAX_WAITING} invitations wait already. Withdraw one first.`,
    );
  }
  const token = newSecretToken();
  const row = await database.models.invitations.create(
    {
      ...invited,
      id: randomUUID(),
      teamId,
      tokenHash: hashSecretToken(token),
      invitedBy: by.id,
      invitedAt: now().toISOString(),
      expiresAt: expiryOf('invitation', now()),
    },
    { transaction },
  );
  await putInvitationMail(deps, row, by, token, transaction);
  const change = { teamId, by: by.id, now: now(), action: 'invite', before: null, after: factsOf(row) };
  await auditTeam(database, change, transaction);
  return toInvitation(row, by.name, now());
}

/** From now on its link opens nothing, and its mail is not sent any more. 404. */
export async function withdrawInvitation(
  { database, now }: InvitationDeps,
  teamId: string,
  { by, id }: { readonly by: string; readonly id: string },
): Promise<void> {
  await database.write(async (transaction) => {
    const row = await database.models.invitations.findOne({ where: { id, teamId }, transaction });
    if (!row) throw notFound('There is no such invitation. It may have been accepted.');
    await end(database, row, 'The invitation was withdrawn before this was sent.', transaction);
    const change = {
      teamId,
      by,
      now: now(),
      action: 'withdraw invitation',
      before: factsOf(row),
      after: null,
    };
    await auditTeam(database, change, transaction);
  });
}

async function assertNotInTeam(
  database: Database,
  teamId: string,
  { email, name }: Invited,
  transaction: Transaction,
): Promise<void> {
  const user = await database.models.users.findOne({
    attributes: ['id'],
    where: { email },
    raw: true,
    transaction,
  });
  if (!user) return;
  const where = { teamId, userId: user.id };
  if ((await database.models.memberships.count({ where, transaction })) > 0) {
    throw new AppError(409, 'in-the-team', `${name} is in the team already, with this address.`, {
      fields: { email: 'Somebody of the team has this address already.' },
    });
  }
}

async function end(
  database: Database,
  row: InvitationModel,
  reason: string,
  transaction: Transaction,
): Promise<void> {
  await row.destroy({ transaction });
  await dropFromOutbox(database, row.id, reason, transaction);
}

async function putInvitationMail(
  { database, now, publicAddress }: InvitationDeps,
  row: InvitationModel,
  by: Inviter,
  token: string,
  transaction: Transaction,
): Promise<void> {
  const team = await database.models.teams.findByPk(row.teamId, { transaction });
  const mail = composeMail('invitation', {
    name: row.name,
    by: by.name,
    team: team?.name ?? '',
    university: team?.university ?? '',
    role: ROLE_WORDS[row.role],
    until: sayUtc(row.expiresAt),
  });
  await putInOutbox(
    database,
    {
      ...mail,
      kind: 'invitation',
      teamId: row.teamId,
      concerns: row.id,
      to: { name: row.name, address: row.email },
      link: `${publicAddress()}/join/${token}`,
      now: now(),
    },
    transaction,
  );
}

function factsOf({ id, email, name, role }: InvitationModel) {
  return { table: 'invitations', id, email, name, role };
}

function toInvitation(row: InvitationModel, by: string, now: Date): Invitation {
  return {
    id: row.id,
    name: row.name,
    email: row.email,
    role: row.role,
    by,
    at: row.invitedAt,
    until: row.expiresAt,
    isOver: row.expiresAt <= now.toISOString(),
  };
}
