/** How single definition rows are written inside a step. */
import { randomUUID } from 'node:crypto';
import type { Transaction } from 'sequelize';
import type { Claim, Evidence } from '#shared/evidence/evidence.ts';
import type { DefinitionTable } from '#shared/contracts/evidence.ts';
import type { EvidenceChange } from '#shared/contracts/evidence-changes.ts';
import type { Task } from '#shared/contracts/teams.ts';
import type { Database } from '#server/database/database.ts';
import { changedMeanwhile, notFound } from '#server/errors/refusals.ts';
import type { DefinitionModel } from './model.ts';
import type { StepDraft } from './service.ts';

export type DefinitionRow = Evidence[DefinitionTable][number];

/** A change of a definition; the row must be of that table, which the schema of its endpoint has seen to. */
function toChange(table: DefinitionTable, id: string, row: DefinitionRow | null): EvidenceChange {
  return { table, id, row } as EvidenceChange;
}

/** The next place in a table. Removed rows keep theirs, so that a number or letter is never given twice. */
export async function nextPosition(
  database: Database,
  table: DefinitionTable,
  problemId: string,
  transaction: Transaction,
): Promise<number> {
  const last = await database.models.definitions[table].max<number | null, DefinitionModel>('position', {
    where: { problemId },
    transaction,
  });
  return (last ?? 0) + 1;
}

export async function insertContent(
  database: Database,
  problemId: string,
  table: DefinitionTable,
  placed: { readonly row: DefinitionRow; readonly position: number },
  draft: StepDraft,
): Promise<void> {
  const { row, position } = placed;
  await database.models.definitions[table].create(
    { problemId, id: row.id, position, content: JSON.stringify(row) },
    { transaction: draft.transaction },
  );
  draft.change(toChange(table, row.id, row), null, 1);
}

/** Replaces a row's content; `ifMatch`, where given, is the version it must have. Returns its new version. */
export async function replaceContent(
  database: Database,
  problemId: string,
  table: DefinitionTable,
  row: DefinitionRow,
  draft: StepDraft,
  ifMatch?: number,
): Promise<number> {
  const before = getRow(draft.evidence, table, row.id);
  const version = draft.rowVersions[row.id] ?? 0;
  if (ifMatch !== undefined && ifMatch !== version) throw changedMeanwhile();
  await database.models.definitions[table].update(
    { content: JSON.stringify(row), rowVersion: version + 1 },
    { where: { problemId, id: row.id }, transaction: draft.transaction },
  );
  draft.change(toChange(table, row.id, row), before, version + 1);
  return version + 1;
}

export async function removeRow(
  database: Database,
  problemId: string,
  table: DefinitionTable,
  id: string,
  draft: StepDraft,
): Promise<void> {
  const before = getRow(draft.evidence, table, id);
  await database.models.definitions[table].update(
    { removedAt: draft.at },
    { where: { problemId, id }, transaction: draft.transaction },
  );
  draft.change(toChange(table, id, null), before);
}

/** The row as it stands, or 404. */
export function getRow(evidence: Evidence, table: DefinitionTable, id: string): DefinitionRow {
  const rows: readonly DefinitionRow[] = evidence[table];
  const row = rows.find((candidate) => candidate.id === id);
  if (!row) throw notFound('This is not here any more. Somebody may have removed it.');
  return row;
}

/** The claim that a task of the problem begins as. */
export function claimForTask(task: Task, n: number, at: string): Claim {
  return { id: randomUUID(), n, text: task.text, test: null, task: task.id, declaredAt: at };
}

export async function addClaimForTask(
  database: Database,
  problemId: string,
  task: Task,
  draft: StepDraft,
): Promise<void> {
  const position = await nextPosition(database, 'claims', problemId, draft.transaction);
  const row = claimForTask(task, position, draft.at);
  await insertContent(database, problemId, 'claims', { row, position }, draft);
}
