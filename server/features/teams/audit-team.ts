import type { Transaction } from 'sequelize';
import type { Database } from '#server/database/database.ts';

export interface TeamAudit {
  readonly teamId: string;
  readonly by: string;
  readonly now: Date;
  readonly action: string;
  readonly before: object | null;
  readonly after: object | null;
}

/** Writes down a change of who sees what in a team; pass the facts without any secret. */
export async function auditTeam(
  database: Database,
  { teamId, by, now, action, before, after }: TeamAudit,
  transaction: Transaction,
): Promise<void> {
  await database.models.auditEvents.create(
    {
      teamId,
      problemId: null,
      version: null,
      mutationId: null,
      userId: by,
      at: now.toISOString(),
      action,
      before: JSON.stringify(before === null ? [] : [before]),
      changes: JSON.stringify(after === null ? [] : [after]),
    },
    { transaction },
  );
}
