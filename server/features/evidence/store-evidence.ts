import type { Transaction } from 'sequelize';
import type { Evidence } from '#shared/evidence/evidence.ts';
import type { DefinitionTable } from '#shared/contracts/evidence.ts';
import type { Database } from '#server/database/database.ts';
import { positionOfLetter } from './series-letter.ts';
import { DEFINITION_TABLES } from './model.ts';

/** Writes whole evidence into a problem that has none: a new problem's first claims, or the demonstration. */
export async function storeEvidence(
  database: Database,
  problemId: string,
  evidence: Evidence,
  userIdOf: (name: string) => string,
  transaction: Transaction,
): Promise<void> {
  for (const table of DEFINITION_TABLES) {
    await database.models.definitions[table].bulkCreate(
      evidence[table].map((row, index) => ({
        problemId,
        id: row.id,
        position: positionOf(row, index),
        content: JSON.stringify(row),
      })),
      { transaction },
    );
  }
  await database.models.trials.bulkCreate(
    evidence.trials.map((trial) => ({
      problemId,
      id: trial.id,
      seriesId: trial.series,
      number: trial.number,
      runOrder: trial.order,
      userId: userIdOf(trial.by),
      by: trial.by,
      at: trial.at,
      values: JSON.stringify(trial.values),
      note: trial.note ?? null,
      excluded: trial.excluded ? JSON.stringify(trial.excluded) : null,
      withdrawn: trial.withdrawn ? JSON.stringify(trial.withdrawn) : null,
      loggedVersion: evidence.version,
    })),
    { transaction },
  );
}

/** The place of a row: what it is numbered or lettered by, otherwise its order. */
function positionOf(row: Evidence[DefinitionTable][number], index: number): number {
  if ('n' in row) return row.n;
  if ('letter' in row) return positionOfLetter(row.letter);
  return index + 1;
}
