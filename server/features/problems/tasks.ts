import type { Transaction } from 'sequelize';
import type { Claim } from '#shared/evidence/evidence.ts';
import type { Task } from '#shared/contracts/teams.ts';
import type { Database } from '#server/database/database.ts';
import { addClaimForTask, replaceContent } from '#server/features/evidence/service.ts';
import type { StepDraft } from '#server/features/evidence/service.ts';

export async function insertTasks(
  database: Database,
  problemId: string,
  tasks: readonly Task[],
  transaction: Transaction,
): Promise<void> {
  await database.models.tasks.bulkCreate(
    tasks.map(({ id, text }, position) => ({ problemId, id, position, text })),
    { transaction },
  );
}

/**
 * Replaces the tasks. Each new one gets its claim without a test; a claim made for a task that is gone stays as a claim
 * of its own, for it may carry the team's work.
 */
export async function changeTasks(
  database: Database,
  problemId: string,
  tasks: readonly Task[],
  draft: StepDraft,
): Promise<void> {
  const { transaction } = draft;
  const rows = await database.models.tasks.findAll({ where: { problemId }, raw: true, transaction });
  const known = new Set(rows.map(({ id }) => id));
  const wanted = new Set(tasks.map(({ id }) => id));
  await database.models.tasks.destroy({ where: { problemId }, transaction });
  await insertTasks(database, problemId, tasks, transaction);
  for (const task of tasks) {
    if (!known.has(task.id)) await addClaimForTask(database, problemId, task, draft);
  }
  for (const claim of draft.evidence.claims) {
    if (claim.task !== undefined && !wanted.has(claim.task)) {
      await replaceContent(database, problemId, 'claims', withoutTask(claim), draft);
    }
  }
}

function withoutTask({ task: _gone, ...claim }: Claim): Claim {
  return claim;
}
