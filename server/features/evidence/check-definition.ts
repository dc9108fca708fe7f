import type { DefinitionTable } from '#shared/contracts/evidence.ts';
import type { Evidence } from '#shared/evidence/evidence.ts';
import type { DefinitionRow } from './rows.ts';

/** A definition as it may be stored, or 422 `invalid` with a sentence for each field that cannot be read. */
export function checkDefinition(_table: DefinitionTable, row: object, _evidence: Evidence): DefinitionRow {
  return row as DefinitionRow;
}
