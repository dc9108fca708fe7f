import type { Transaction } from 'sequelize';
import type { OpenInvitation } from '#shared/contracts/people.ts';
import type { Database } from '#server/database/database.ts';
import { deadLink } from '#server/errors/refusals.ts';
import { hashSecretToken } from '#server/tokens/secret-token.ts';
import type { InvitationModel } from './model.ts';

/** The invitation that a link opens; the one 404 of dead links otherwise. */
export async function getByToken(
  database: Database,
  token: string,
  now: Date,
  transaction: Transaction | null = null,
): Promise<InvitationModel> {
  const row = await database.models.invitations.findOne({
    where: { tokenHash: hashSecretToken(token) },
    raw: true,
    transaction,
  });
  if (!row || row.expiresAt <= now.toISOString()) throw deadLink();
  return row;
}

/** What an invitation says to who holds its link. */
export async function readInvitation(
  { database, now }: { readonly database: Database; readonly now: () => Date },
  token: string,
): Promise<OpenInvitation> {
  const row = await getByToken(database, token, now());
  const { teams, users } = database.models;
  const team = await teams.findByPk(row.teamId, { raw: true });
  const inviter = await users.findByPk(row.invitedBy, { attributes: ['name'], raw: true });
  if (!team || !inviter) throw deadLink();
  return {
    team: team.name,
    university: team.university,
    role: row.role,
    by: inviter.name,
    name: row.name,
    email: row.email,
    until: row.expiresAt,
    hasAccount: (await users.count({ where: { email: row.email } })) > 0,
  };
}
