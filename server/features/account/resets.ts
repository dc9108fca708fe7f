import { Op } from 'sequelize';
import type { ServerDeps } from '#server/deps.ts';
import { deadLink } from '#server/errors/refusals.ts';
import { composeMail } from '#server/mail/compose-mail.ts';
import { putInOutbox } from '#server/mail/outbox.ts';
import { expiryOf, sayUtc } from '#server/tokens/expiry.ts';
import { hashSecretToken, newSecretToken } from '#server/tokens/secret-token.ts';
import { hashPassphrase } from './passphrase.ts';

/** Sends a link for a new passphrase to a person who may sign in; does nothing for every other address. */
export async function askForReset(
  { database, now, publicAddress }: Pick<ServerDeps, 'database' | 'now' | 'publicAddress'>,
  email: string,
): Promise<void> {
  const { users, tokens } = database.models;
  const user = await users.findOne({ where: { email, disabledAt: null }, raw: true });
  if (!user) return;
  const token = newSecretToken();
  const expiresAt = expiryOf('reset', now());
  await database.write(async (transaction) => {
    await tokens.destroy({ where: { expiresAt: { [Op.lt]: now().toISOString() } }, transaction });
    await tokens.create(
      { tokenHash: hashSecretToken(token), kind: 'reset', userId: user.id, expiresAt },
      { transaction },
    );
    await putInOutbox(
      database,
      {
        ...composeMail('reset', { name: user.name, until: sayUtc(expiresAt) }),
        kind: 'reset',
        teamId: null,
        concerns: null,
        to: { name: user.name, address: user.email },
        link: `${publicAddress()}/reset/${token}`,
        now: now(),
      },
      transaction,
    );
  });
}

/** Sets the passphrase of the link's person, uses up every link of theirs, and signs them out everywhere. */
export async function resetPassphrase(
  { database, now, sockets }: Pick<ServerDeps, 'database' | 'now' | 'sockets'>,
  token: string,
  passphrase: string,
): Promise<void> {
  const { users, tokens, sessions } = database.models;
  const where = {
    tokenHash: hashSecretToken(token),
    kind: 'reset' as const,
    expiresAt: { [Op.gt]: now().toISOString() },
  };
  if ((await tokens.count({ where })) === 0) throw deadLink();
  const passphraseHash = await hashPassphrase(passphrase);
  const userId = await database.write(async (transaction) => {
    // Asked again: the same link may have been used while the passphrase was being hashed.
    const row = await tokens.findOne({ where, raw: true, transaction });
    if (!row?.userId) throw deadLink();
    const id = row.userId;
    const passphraseChangedAt = now().toISOString();
    const [changed] = await users.update(
      { passphraseHash, passphraseChangedAt },
      { where: { id, disabledAt: null }, transaction },
    );
    if (changed === 0) throw deadLink();
    await tokens.destroy({ where: { userId: id, kind: 'reset' }, transaction });
    await sessions.destroy({ where: { userId: id }, transaction });
    return id;
  });
  sockets.signOutPerson(userId);
}
