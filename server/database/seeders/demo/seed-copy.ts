import type { Transaction } from 'sequelize';
import type { Database } from '#server/database/database.ts';
import { hashSecretToken } from '#server/tokens/secret-token.ts';

/** Anybody may try the invented copy, so its token is no secret; it is offered beside the demonstration's sign-ins. */
export const DEMO_COPY_TOKEN = 'leaning-spout-as-lent-to-gannet-bank-by-tern-rock';

const DAY = 86_400_000;

/** Lends the second edition of problem 1 to the team that opposes it: from the day before the first start, for a week. */
export async function seedCopy(
  database: Database,
  firstStart: Date,
  transaction: Transaction,
): Promise<void> {
  const edition = await database.models.editions.findOne({
    attributes: ['id'],
    where: { problemId: 'demo-problem-1', n: 2 },
    raw: true,
    transaction,
  });
  if (!edition) return;
  const days = (count: number) => new Date(firstStart.getTime() + count * DAY).toISOString();
  await database.models.copies.create(
    {
      id: 'demo-copy',
      teamId: 'demo-tern-rock',
      problemId: 'demo-problem-1',
      editionId: edition.id,
      number: 1,
      tokenHash: hashSecretToken(DEMO_COPY_TOKEN),
      recipient: 'Gannet Bank',
      recipientTeamId: 'demo-gannet-bank',
      reader: 'opponent',
      passphraseHash: null,
      opensAt: days(-1),
      closesAt: days(7),
      mayPrint: true,
      lentAt: days(-1),
      lentBy: 'demo-ines',
    },
    { transaction },
  );
}
