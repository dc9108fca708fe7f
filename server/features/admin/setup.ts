import { randomUUID } from 'node:crypto';
import { Op } from 'sequelize';
import type { Transaction } from 'sequelize';
import type { Database } from '#server/database/database.ts';
import type { ServerDeps } from '#server/deps.ts';
import { deadLink, invalid } from '#server/errors/refusals.ts';
import { hashPassphrase } from '#server/features/account/service.ts';
import { expiryOf } from '#server/tokens/expiry.ts';
import { hashSecretToken, newSecretToken } from '#server/tokens/secret-token.ts';

/**
 * The one link that makes the administrator's account; null once there is one. Each call ends the link before it, so
 * a lost link is mended by starting again.
 */
export async function createSetupLink({
  database,
  now,
  publicAddress,
}: Pick<ServerDeps, 'database' | 'now' | 'publicAddress'>): Promise<string | null> {
  const token = newSecretToken();
  const isMade = await database.write(async (transaction) => {
    if (await hasAdministrator(database, transaction)) return false;
    await database.models.tokens.destroy({ where: { kind: 'setup' }, transaction });
    await database.models.tokens.create(
      {
        tokenHash: hashSecretToken(token),
        kind: 'setup',
        userId: null,
        expiresAt: expiryOf('setup', now()),
      },
      { transaction },
    );
    return true;
  });
  return isMade ? `${publicAddress()}/setup/${token}` : null;
}

type SetupDeps = Pick<ServerDeps, 'database' | 'now'>;

/** Until when the link opens the set-up; the one 404 of dead links otherwise. */
export async function readSetup(
  { database, now }: SetupDeps,
  token: string,
  transaction: Transaction | null = null,
): Promise<{ until: string }> {
  const row = await database.models.tokens.findOne({
    where: {
      tokenHash: hashSecretToken(token),
      kind: 'setup',
      expiresAt: { [Op.gt]: now().toISOString() },
    },
    raw: true,
    transaction,
  });
  if (!row || (await hasAdministrator(database, transaction))) throw deadLink();
  return { until: row.expiresAt };
}

/** Makes the administrator's account and uses the link up. */
export async function setUp(
  deps: SetupDeps,
  token: string,
  { name, email, passphrase }: { readonly name: string; readonly email: string; readonly passphrase: string },
): Promise<Express.User> {
  const { users, tokens } = deps.database.models;
  await readSetup(deps, token);
  const passphraseHash = await hashPassphrase(passphrase);
  const id = randomUUID();
  const at = deps.now().toISOString();
  await deps.database.write(async (transaction) => {
    // Asked again: the same link may have been used while the passphrase was being hashed.
    await readSetup(deps, token, transaction);
    if ((await users.count({ where: { email }, transaction })) > 0) {
      throw invalid({ email: 'This address has an account already. Use one that belongs to no team.' });
    }
    await tokens.destroy({ where: { kind: 'setup' }, transaction });
    await users.create(
      { id, email, name, passphraseHash, passphraseChangedAt: at, createdAt: at, isAdministrator: true },
      { transaction },
    );
  });
  return { id, name, email };
}

async function hasAdministrator(database: Database, transaction: Transaction | null): Promise<boolean> {
  return (await database.models.users.count({ where: { isAdministrator: true }, transaction })) > 0;
}
