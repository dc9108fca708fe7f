import { randomUUID } from 'node:crypto';
import type { Transaction } from 'sequelize';
import type { Database } from '#server/database/database.ts';
import { AppError } from '#server/errors/app-error.ts';
import { notFound } from '#server/errors/refusals.ts';
import type { MailEntry, MailKind } from '#shared/contracts/people.ts';
import type { ComposedMail } from './compose-mail.ts';
import type { MailModel } from './model.ts';

export interface NewMail extends ComposedMail {
  readonly kind: MailKind | 'reset';
  readonly teamId: string | null;
  readonly concerns: string | null;
  readonly to: { readonly name: string; readonly address: string };
  readonly link: string;
  readonly now: Date;
}

/** Puts a mail where the delivery finds it, in the same transaction as what it tells of: both happen or neither. */
export async function putInOutbox(
  database: Database,
  { to, now, ...mail }: NewMail,
  transaction: Transaction,
): Promise<void> {
  const at = now.toISOString();
  await database.models.outbox.create(
    { id: randomUUID(), ...mail, name: to.name, address: to.address, nextTryAt: at, writtenAt: at },
    { transaction },
  );
}

/** What is about this and not yet sent never will be; the reason is told to who looks at the mail. */
export async function dropFromOutbox(
  database: Database,
  concerns: string,
  reason: string,
  transaction: Transaction,
): Promise<void> {
  await database.models.outbox.update(
    { state: 'failed', link: null, nextTryAt: null, error: reason },
    { where: { concerns, state: ['waiting', 'failed'] }, transaction },
  );
}

const MAX_LISTED = 100;

/** The mail that a team caused, the newest first. What a person asked for themselves belongs to no team. */
export async function listOutbox(database: Database, teamId: string): Promise<MailEntry[]> {
  const rows = await database.models.outbox.findAll({
    where: { teamId },
    order: [
      ['writtenAt', 'DESC'],
      ['id', 'ASC'],
    ],
    limit: MAX_LISTED,
    raw: true,
  });
  return rows.flatMap((row) => (row.kind === 'reset' ? [] : [toEntry(row, row.kind)]));
}

function toEntry(row: MailModel, kind: MailKind): MailEntry {
  return {
    id: row.id,
    kind,
    to: { name: row.name, address: row.address },
    subject: row.subject,
    text: row.text,
    state: row.state,
    writtenAt: row.writtenAt,
    sentAt: row.sentAt,
    nextTryAt: row.nextTryAt,
    error: row.error,
    mayRetry: mayRetry(row),
  };
}

function mayRetry({ state, link }: Pick<MailModel, 'state' | 'link'>): boolean {
  return state !== 'sent' && link !== null;
}

/** Has a team's mail tried again at once. 404; 409 `not-to-be-sent` for what was sent or is of no use any more. */
export async function retryMail(database: Database, teamId: string, id: string, now: Date): Promise<void> {
  await database.write(async (transaction) => {
    const row = await database.models.outbox.findOne({ where: { id, teamId }, transaction });
    if (!row) throw notFound('There is no such mail of this team.');
    if (!mayRetry(row)) {
      throw new AppError(
        409,
        'not-to-be-sent',
        'This mail was sent, or what it tells of is over. Invite the person again.',
      );
    }
    await row.update(
      { state: 'waiting', tries: 0, nextTryAt: now.toISOString(), error: null },
      { transaction },
    );
  });
}
