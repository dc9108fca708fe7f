import { randomUUID } from 'node:crypto';
import type { Transaction } from 'sequelize';
import { newPassphraseSchema } from '#shared/contracts/people.ts';
import { AppError } from '#server/errors/app-error.ts';
import { invalid } from '#server/errors/refusals.ts';
import type { ServerDeps } from '#server/deps.ts';
import { checkSignIn, hashPassphrase, isAdministrator } from '#server/features/account/service.ts';
import { auditTeam } from '#server/features/teams/service.ts';
import type { TeamPlace } from '#server/features/teams/service.ts';
import { dropFromOutbox } from '#server/mail/outbox.ts';
import { getByToken } from './find-invitation.ts';
import type { InvitationModel } from './model.ts';

type JoinDeps = Pick<ServerDeps, 'database' | 'now' | 'sockets' | 'events'>;

export interface Joined {
  readonly user: Express.User;
  readonly team: string;
}

/** Makes the account, or asks for the passphrase of the one there is; joins the team; and uses the link up. */
export async function acceptInvitation(
  deps: JoinDeps,
  token: string,
  given: { readonly name: string; readonly passphrase: string },
): Promise<Joined> {
  const { database, now } = deps;
  const { email } = await getByToken(database, token, now());
  const hasAccount = (await database.models.users.count({ where: { email } })) > 0;
  const account = hasAccount ? await ownAccount(deps, email, given.passphrase) : null;
  const passphraseHash = account ? null : await newHash(given.passphrase);
  const joined = await database.write(async (transaction) => {
    // Asked again: the same link may have been used while the passphrase was being hashed.
    const invitation = await getByToken(database, token, now(), transaction);
    const user = account ?? (await makeAccount(deps, email, given.name, passphraseHash ?? '', transaction));
    return { user, place: await join(deps, invitation, user.id, transaction) };
  });
  deps.sockets.closePerson(joined.user.id);
  deps.events.publishStale(joined.place, 'team');
  deps.events.publishStale(joined.place, 'invitations');
  return { user: joined.user, team: joined.place.team.slug };
}

async function ownAccount({ database }: JoinDeps, email: string, passphrase: string): Promise<Express.User> {
  const user = await checkSignIn(database, email, passphrase);
  if (!user) {
    const sentence = 'This is not the passphrase of the account with this address.';
    throw new AppError(422, 'wrong-passphrase', sentence, { fields: { passphrase: sentence } });
  }
  if (await isAdministrator(database, user.id)) {
    throw new AppError(
      409,
      'administrator',
      'This account looks after the installation and reads no problem. Ask to be invited with another address.',
    );
  }
  return user;
}

async function newHash(passphrase: string): Promise<string> {
  const parsed = newPassphraseSchema.safeParse(passphrase);
  if (!parsed.success) throw invalid({ passphrase: parsed.error.issues[0]?.message ?? '' });
  return hashPassphrase(parsed.data);
}

async function makeAccount(
  { database, now }: JoinDeps,
  email: string,
  name: string,
  passphraseHash: string,
  transaction: Transaction,
): Promise<Express.User> {
  const { users } = database.models;
  if ((await users.count({ where: { email }, transaction })) > 0) {
    throw new AppError(
      409,
      'changed-meanwhile',
      'An account with this address was made meanwhile. Try again.',
    );
  }
  const id = randomUUID();
  const at = now().toISOString();
  await users.create(
    { id, email, name, passphraseHash, passphraseChangedAt: at, createdAt: at },
    { transaction },
  );
  return { id, name, email };
}

async function join(
  { database, now }: JoinDeps,
  invitation: InvitationModel,
  userId: string,
  transaction: Transaction,
): Promise<TeamPlace> {
  const { teamId, role } = invitation;
  const { memberships, invitations, teams } = database.models;
  const last = Number((await memberships.max('position', { where: { teamId }, transaction })) ?? -1);
  // Somebody who is in the team by another invitation keeps the role they have.
  const [membership, isNew] = await memberships.findOrCreate({
    where: { teamId, userId },
    defaults: { teamId, userId, role, position: last + 1 },
    transaction,
  });
  await invitations.destroy({ where: { id: invitation.id }, transaction });
  await dropFromOutbox(
    database,
    invitation.id,
    'The invitation was accepted before this was sent.',
    transaction,
  );
  if (isNew) {
    const after = { table: 'memberships', id: userId, role };
    await auditTeam(
      database,
      { teamId, by: userId, now: now(), action: 'join team', before: null, after },
      transaction,
    );
  }
  const team = await teams.findByPk(teamId, { attributes: ['slug'], transaction });
  return { team: { id: teamId, slug: team?.slug ?? '' }, role: membership.role };
}
