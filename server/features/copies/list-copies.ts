/** Rows of copies as the teams see them: what is out, how often it was opened, and what is lent to them. */
import { col, fn, Op, type Transaction, type WhereOptions } from 'sequelize';
import { MAX_COPIES, type BorrowedCopy, type Copy } from '#shared/contracts/copies.ts';
import type { Database } from '#server/database/database.ts';
import type { CopyModel } from './model.ts';
import { standingAt } from './standing.ts';

/** Copies that fit, the newest first. */
export async function findCopies(
  database: Database,
  where: WhereOptions<CopyModel>,
  now: Date,
  transaction: Transaction | null = null,
): Promise<Copy[]> {
  const rows = await findRows(database, where, transaction);
  const lent = await lentEditions(database, rows, now, transaction);
  const views = await countViews(database, rows, transaction);
  const people = await database.models.users.findAll({
    attributes: ['id', 'name'],
    where: { id: rows.map(({ lentBy }) => lentBy) },
    raw: true,
    transaction,
  });
  const names = new Map(people.map(({ id, name }) => [id, name]));
  return rows.map((row, index) => ({
    ...(lent[index] as (typeof lent)[number]),
    id: row.id,
    number: row.number,
    recipient: row.recipient,
    hasPassphrase: row.passphraseHash !== null,
    mayPrint: Boolean(row.mayPrint),
    lentAt: row.lentAt,
    lentBy: names.get(row.lentBy) ?? '',
    views: views.get(row.id) ?? { opened: 0, printed: 0, firstAt: null, lastAt: null },
  }));
}

/** Copies lent to a team of this installation: what it needs to know of them, and no more. */
export async function findBorrowed(database: Database, teamId: string, now: Date): Promise<BorrowedCopy[]> {
  const rows = await findRows(database, { recipientTeamId: teamId, teamId: { [Op.ne]: teamId } }, null);
  const lent = await lentEditions(database, rows, now, null);
  const teams = await database.models.teams.findAll({
    attributes: ['id', 'name'],
    where: { id: rows.map((row) => row.teamId) },
    raw: true,
  });
  const names = new Map(teams.map(({ id, name }) => [id, name]));
  return rows.map((row, index) => ({
    ...(lent[index] as (typeof lent)[number]),
    id: row.id,
    team: names.get(row.teamId) ?? '',
  }));
}

function findRows(
  database: Database,
  where: WhereOptions<CopyModel>,
  transaction: Transaction | null,
): Promise<CopyModel[]> {
  return database.models.copies.findAll({
    where,
    order: [
      ['lentAt', 'DESC'],
      ['number', 'DESC'],
    ],
    limit: MAX_COPIES,
    raw: true,
    transaction,
  });
}

async function lentEditions(
  database: Database,
  rows: readonly CopyModel[],
  now: Date,
  transaction: Transaction | null,
) {
  const { problems, editions } = database.models;
  const [problemRows, editionRows] = await Promise.all([
    problems.findAll({
      attributes: ['id', 'number', 'title'],
      where: { id: rows.map(({ problemId }) => problemId) },
      raw: true,
      transaction,
    }),
    editions.findAll({
      attributes: ['id', 'n', 'seal', 'frozenAt'],
      where: { id: rows.map(({ editionId }) => editionId) },
      raw: true,
      transaction,
    }),
  ]);
  const problemOf = new Map(problemRows.map((row) => [row.id, row]));
  const editionOf = new Map(editionRows.map((row) => [row.id, row]));
  return rows.map((row) => {
    const problem = problemOf.get(row.problemId);
    const edition = editionOf.get(row.editionId);
    if (!problem || !edition) throw new Error(`lentEditions: copy ${row.id} has lost what it was made of`);
    return {
      problem: { number: problem.number, title: problem.title },
      edition: { n: edition.n, seal: edition.seal, at: edition.frozenAt },
      reader: row.reader,
      from: row.opensAt,
      until: row.closesAt,
      standing: standingAt(row, now),
      takenBackAt: row.revokedAt,
    };
  });
}

interface ViewCount {
  readonly copyId: string;
  readonly kind: 'opened' | 'printed';
  readonly times: number;
  readonly firstAt: string;
  readonly lastAt: string;
}

async function countViews(
  database: Database,
  rows: readonly CopyModel[],
  transaction: Transaction | null,
): Promise<Map<string, Copy['views']>> {
  const counts = (await database.models.copyViews.findAll({
    attributes: [
      'copyId',
      'kind',
      [fn('COUNT', col('id')), 'times'],
      [fn('MIN', col('at')), 'firstAt'],
      [fn('MAX', col('at')), 'lastAt'],
    ],
    where: { copyId: rows.map(({ id }) => id) },
    group: ['copyId', 'kind'],
    raw: true,
    transaction,
  })) as unknown as readonly ViewCount[];
  const views = new Map<string, Copy['views']>();
  for (const { copyId, kind, times, firstAt, lastAt } of counts) {
    const before = views.get(copyId) ?? { opened: 0, printed: 0, firstAt: null, lastAt: null };
    views.set(copyId, {
      ...before,
      [kind]: times,
      firstAt: before.firstAt === null || firstAt < before.firstAt ? firstAt : before.firstAt,
      lastAt: before.lastAt === null || lastAt > before.lastAt ? lastAt : before.lastAt,
    });
  }
  return views;
}
