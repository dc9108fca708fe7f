import type { Transaction } from 'sequelize';
import type { Evidence, Trial } from '#shared/evidence/evidence.ts';
import type { DefinitionTable } from '#shared/contracts/evidence.ts';
import type { Database } from '#server/database/database.ts';
import { notFound } from '#server/errors/refusals.ts';
import { DEFINITION_TABLES } from './model.ts';

export interface StoredEvidence {
  readonly evidence: Evidence;
  /** Row version of every definition, by id. */
  readonly rowVersions: Readonly<Record<string, number>>;
}

/** Reads a problem's evidence as it stands in this transaction. Rows were checked when they were written. */
export async function readEvidence(
  database: Database,
  problemId: string,
  transaction: Transaction,
): Promise<StoredEvidence> {
  const { problems, trials } = database.models;
  const problem = await problems.findByPk(problemId, { raw: true, transaction });
  if (!problem) throw notFound();
  const rowVersions: Record<string, number> = {};
  const tables: Record<string, unknown[]> = {};
  for (const table of DEFINITION_TABLES) {
    tables[table] = await readDefinitions(database, table, problemId, rowVersions, transaction);
  }
  const trialRows = await trials.findAll({
    where: { problemId },
    order: [['runOrder', 'ASC']],
    raw: true,
    transaction,
  });
  const evidence = {
    version: problem.evidenceVersion,
    settings: JSON.parse(problem.settings) as Evidence['settings'],
    ...tables,
    trials: trialRows.map(toTrial),
  } as Evidence;
  return { evidence, rowVersions };
}

async function readDefinitions(
  database: Database,
  table: DefinitionTable,
  problemId: string,
  rowVersions: Record<string, number>,
  transaction: Transaction,
): Promise<unknown[]> {
  const rows = await database.models.definitions[table].findAll({
    where: { problemId, removedAt: null },
    order: [['position', 'ASC']],
    raw: true,
    transaction,
  });
  for (const { id, rowVersion } of rows) rowVersions[id] = rowVersion;
  return rows.map(({ content }) => JSON.parse(content) as unknown);
}

/** A stored trial as evidence has it. */
export interface TrialRow {
  readonly id: string;
  readonly seriesId: string;
  readonly number: number;
  readonly runOrder: number;
  readonly by: string;
  readonly at: string;
  readonly values: string;
  readonly note: string | null;
  readonly excluded: string | null;
  readonly withdrawn: string | null;
}

export function toTrial(row: TrialRow): Trial {
  return {
    id: row.id,
    number: row.number,
    series: row.seriesId,
    order: row.runOrder,
    by: row.by,
    at: row.at,
    values: JSON.parse(row.values) as Trial['values'],
    ...(row.note === null ? {} : { note: row.note }),
    ...(row.excluded === null ? {} : { excluded: JSON.parse(row.excluded) as Trial['excluded'] }),
    ...(row.withdrawn === null ? {} : { withdrawn: JSON.parse(row.withdrawn) as Trial['withdrawn'] }),
  };
}
