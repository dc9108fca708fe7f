import { Op } from 'sequelize';
import type { Database } from '#server/database/database.ts';
import { AppError } from '#server/errors/app-error.ts';
import type { OpenSockets } from '#server/sockets/open-sockets.ts';
import type { Actor } from '#server/middleware/actor.ts';
import { DEMO_PEOPLE } from '#server/database/seeders/demo/people.ts';
import type { DemoPerson } from '#server/database/seeders/demo/people.ts';
import { fitsPassphrase, hashPassphrase } from './passphrase.ts';

export type { UserModel } from './model.ts';
export { fitsPassphrase, hashPassphrase } from './passphrase.ts';

interface Person {
  readonly id: string;
  readonly name: string;
  readonly email: string;
}

/** A person who may be signed in, or null. */
export async function findUser(database: Database, id: string): Promise<Person | null> {
  return database.models.users.findOne({
    attributes: ['id', 'name', 'email'],
    where: { id, disabledAt: null },
    raw: true,
  });
}

/** Whether this person looks after the installation. */
export async function isAdministrator(database: Database, id: string): Promise<boolean> {
  return (await database.models.users.count({ where: { id, isAdministrator: true } })) > 0;
}

/** The person whose e-mail and passphrase these are, or null: which of the two was wrong is never told. */
export async function checkSignIn(
  database: Database,
  email: string,
  passphrase: string,
): Promise<Person | null> {
  const user = await database.models.users.findOne({
    where: { email: email.trim().toLowerCase(), disabledAt: null },
    raw: true,
  });
  const fits = await fitsPassphrase(user?.passphraseHash ?? null, passphrase);
  return user && fits ? { id: user.id, name: user.name, email: user.email } : null;
}

/** Changes one's own passphrase and ends every other session of the same person. 422 `wrong-passphrase`. */
export async function changePassphrase(
  deps: { readonly database: Database; readonly sockets: OpenSockets; readonly now: () => Date },
  actor: Actor,
  passphrases: { readonly current: string; readonly next: string },
): Promise<void> {
  const { users, sessions } = deps.database.models;
  const user = await users.findByPk(actor.id, { raw: true });
  if (!(await fitsPassphrase(user?.passphraseHash ?? null, passphrases.current))) {
    const sentence = 'This is not the passphrase you use now. Nothing was changed.';
    throw new AppError(422, 'wrong-passphrase', sentence, { fields: { current: sentence } });
  }
  const passphraseHash = await hashPassphrase(passphrases.next);
  await deps.database.write(async (transaction) => {
    const passphraseChangedAt = deps.now().toISOString();
    await users.update({ passphraseHash, passphraseChangedAt }, { where: { id: actor.id }, transaction });
    await sessions.destroy({ where: { userId: actor.id, sid: { [Op.ne]: actor.sessionId } }, transaction });
  });
  deps.sockets.closeOthers(actor.id, actor.sessionId);
}

/** The people of the demonstration whose passphrases still are the ones it came with; null when it was not loaded. */
export async function listDemoSignIns(database: Database): Promise<DemoPerson[] | null> {
  if ((await database.models.teams.count({ where: { isDemo: true } })) === 0) return null;
  const rows = await database.models.users.findAll({
    attributes: ['email'],
    where: { email: DEMO_PEOPLE.map(({ email }) => email), passphraseChangedAt: null },
    raw: true,
  });
  const unchanged = new Set(rows.map(({ email }) => email));
  return DEMO_PEOPLE.filter(({ email }) => unchanged.has(email));
}
