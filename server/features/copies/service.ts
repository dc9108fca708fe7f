/** Copies of editions, from the side of the team that lends them: lend, look after, take back. The captain does. */
import { randomUUID } from 'node:crypto';
import type { Transaction } from 'sequelize';
import type { z } from 'zod';
import type { BorrowedCopy, Copy, lendSchema } from '#shared/contracts/copies.ts';
import { AppError } from '#server/errors/app-error.ts';
import { invalid, notFound } from '#server/errors/refusals.ts';
import type { ServerDeps } from '#server/deps.ts';
import { hashPassphrase } from '#server/features/account/service.ts';
import { getEdition } from '#server/features/editions/service.ts';
import type { ProblemPlace, TeamPlace } from '#server/features/teams/service.ts';
import type { Actor } from '#server/middleware/actor.ts';
import { findBorrowed, findCopies } from './list-copies.ts';
import type { CopyModel } from './model.ts';
import { hashSecretToken, newSecretToken } from '#server/tokens/secret-token.ts';

export { findDemoCopy } from './read-copy.ts';

export type CopyDeps = Pick<ServerDeps, 'database' | 'events' | 'now'>;

/** Copies of one problem's editions; everybody of the team may ask. */
export function listProblemCopies({ database, now }: CopyDeps, place: ProblemPlace): Promise<Copy[]> {
  return findCopies(database, { problemId: place.problem.id }, now());
}

/** All that is out, and what is lent to the team. */
export async function listTeamCopies(
  { database, now }: CopyDeps,
  place: TeamPlace,
): Promise<{ lent: Copy[]; borrowed: BorrowedCopy[] }> {
  const [lent, borrowed] = await Promise.all([
    findCopies(database, { teamId: place.team.id }, now()),
    findBorrowed(database, place.team.id, now()),
  ]);
  return { lent, borrowed };
}

/** Lends an edition and tells the token, this once. 404 for no such edition, 422 for times that do not fit. */
export async function lendCopy(
  deps: CopyDeps,
  place: ProblemPlace,
  actor: Actor,
  n: number,
  wanted: z.infer<typeof lendSchema>,
): Promise<{ copy: Copy; token: string }> {
  const edition = await getEdition(deps.database, place.problem.id, n);
  assertTimes(wanted.from, wanted.until, deps.now());
  const token = newSecretToken();
  const passphraseHash = wanted.passphrase === null ? null : await hashPassphrase(wanted.passphrase);
  const copy = await deps.database.write(async (transaction) => {
    const row = await deps.database.models.copies.create(
      {
        id: randomUUID(),
        teamId: place.team.id,
        problemId: place.problem.id,
        editionId: edition.id,
        number: await nextNumber(deps, place, transaction),
        tokenHash: hashSecretToken(token),
        recipient: wanted.recipient,
        recipientTeamId: await findTeamOfName(deps, wanted.recipient, transaction),
        reader: wanted.reader,
        passphraseHash,
        opensAt: utc(wanted.from),
        closesAt: utc(wanted.until),
        mayPrint: wanted.mayPrint,
        lentAt: deps.now().toISOString(),
        lentBy: actor.id,
      },
      { transaction },
    );
    await audit(deps, place, actor, { action: `lend edition ${n}`, before: null, after: row }, transaction);
    return copyOf(deps, row.id, transaction);
  });
  await tellTeams(deps, place, copy.id);
  return { copy, token };
}

/** Takes back a copy, or changes until when it is open. 404; 409 `taken-back`; 422 for a time that does not fit. */
export async function changeCopy(
  deps: CopyDeps,
  place: ProblemPlace,
  actor: Actor,
  id: string,
  change: { readonly until?: string | undefined; readonly takenBack?: true | undefined },
): Promise<Copy> {
  const copy = await deps.database.write(async (transaction) => {
    const row = await deps.database.models.copies.findOne({
      where: { id, problemId: place.problem.id },
      transaction,
    });
    if (!row) throw notFound('There is no such copy of this problem.');
    if (row.revokedAt !== null) {
      throw new AppError(409, 'taken-back', 'This copy was taken back. Lend the edition anew.');
    }
    const before = row.get({ plain: true });
    if (change.until !== undefined) {
      assertTimes(row.opensAt, change.until, deps.now());
      row.closesAt = utc(change.until);
    }
    if (change.takenBack) Object.assign(row, { revokedAt: deps.now().toISOString(), revokedBy: actor.id });
    await row.save({ transaction });
    const action = change.takenBack ? `take back copy ${row.number}` : `change copy ${row.number}`;
    await audit(deps, place, actor, { action, before, after: row }, transaction);
    return copyOf(deps, id, transaction);
  });
  await tellTeams(deps, place, id);
  return copy;
}

function assertTimes(from: string, until: string, now: Date): void {
  const ends = Date.parse(until);
  if (ends <= Date.parse(from))
    throw invalid({ until: 'It must close after it opens. Choose a later time.' });
  if (ends <= now.getTime()) throw invalid({ until: 'This time is over. Choose one that lies ahead.' });
}

function utc(moment: string): string {
  return new Date(moment).toISOString();
}

async function nextNumber(
  { database }: CopyDeps,
  { problem }: ProblemPlace,
  transaction: Transaction,
): Promise<number> {
  const where = { problemId: problem.id };
  return Number((await database.models.copies.max('number', { where, transaction })) ?? 0) + 1;
}

/** The recipient's team, where it is here; who lends is not told, for what they cannot see does not exist for them. */
async function findTeamOfName(
  { database }: CopyDeps,
  name: string,
  transaction: Transaction,
): Promise<string | null> {
  const rows = await database.models.teams.findAll({ attributes: ['id', 'name'], raw: true, transaction });
  const wanted = name.toLowerCase();
  const found = rows.filter((row) => row.name.toLowerCase() === wanted);
  return found.length === 1 ? (found[0]?.id ?? null) : null;
}

async function copyOf({ database, now }: CopyDeps, id: string, transaction: Transaction): Promise<Copy> {
  const [copy] = await findCopies(database, { id }, now(), transaction);
  if (!copy) throw notFound('There is no such copy of this problem.');
  return copy;
}

/** The audit log names what was lent to whom and until when, and no hash. */
async function audit(
  { database, now }: CopyDeps,
  place: ProblemPlace,
  actor: Actor,
  {
    action,
    before,
    after,
  }: { readonly action: string; readonly before: CopyFacts | null; readonly after: CopyFacts },
  transaction: Transaction,
): Promise<void> {
  await database.models.auditEvents.create(
    {
      teamId: place.team.id,
      problemId: place.problem.id,
      version: null,
      mutationId: null,
      userId: actor.id,
      at: now().toISOString(),
      action,
      before: JSON.stringify(before === null ? [] : [factsOf(before)]),
      changes: JSON.stringify([factsOf(after)]),
    },
    { transaction },
  );
}

type CopyFacts = Pick<
  CopyModel,
  'id' | 'number' | 'recipient' | 'reader' | 'opensAt' | 'closesAt' | 'mayPrint'
> & { revokedAt?: string | null };

function factsOf({ id, number, recipient, reader, opensAt, closesAt, mayPrint, revokedAt }: CopyFacts) {
  return {
    table: 'copies',
    id,
    number,
    recipient,
    reader,
    opensAt,
    closesAt,
    mayPrint,
    revokedAt: revokedAt ?? null,
  };
}

/** Both teams hear of it where they are here: the one that lends, and the one that reads. */
async function tellTeams({ database, events }: CopyDeps, place: ProblemPlace, id: string): Promise<void> {
  events.publishStale(place, 'copies');
  const row = await database.models.copies.findByPk(id, { attributes: ['recipientTeamId'], raw: true });
  if (!row?.recipientTeamId) return;
  const team = await database.models.teams.findByPk(row.recipientTeamId, { attributes: ['slug'], raw: true });
  if (team) {
    const reader: TeamPlace = { team: { id: row.recipientTeamId, slug: team.slug }, role: 'member' };
    events.publishStale(reader, 'copies');
  }
}
