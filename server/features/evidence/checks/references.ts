/** Whether what a row points at is there. */
import type { Evidence, Selection, ValueReference } from '#shared/evidence/evidence.ts';
import type { DefinitionTable } from '#shared/contracts/evidence.ts';
import type { Fields } from './fields.ts';
import { checkRange, checkReadings } from './numbers.ts';

const NAMES: Readonly<Record<DefinitionTable | 'trials', string>> = {
  instruments: 'instrument',
  quantities: 'quantity',
  series: 'series',
  models: 'model',
  comparisons: 'comparison',
  claims: 'claim',
  charts: 'chart',
  trials: 'trial',
};

export function checkReference(
  evidence: Evidence,
  table: DefinitionTable | 'trials',
  id: string,
  path: string,
  fields: Fields,
): void {
  const rows: readonly { readonly id: string }[] = evidence[table];
  if (!rows.some((row) => row.id === id)) {
    fields.refuse(path, `This ${NAMES[table]} is not here any more. Choose another.`);
  }
}

export function checkReferences(
  evidence: Evidence,
  table: DefinitionTable | 'trials',
  ids: readonly string[],
  path: string,
  fields: Fields,
): void {
  ids.forEach((id, index) => checkReference(evidence, table, id, `${path}.${index}`, fields));
}

export function checkSelection(evidence: Evidence, selection: Selection, path: string, fields: Fields): void {
  checkReferences(evidence, 'series', selection.series, `${path}.series`, fields);
  checkReferences(evidence, 'trials', selection.plusTrials, `${path}.plusTrials`, fields);
  selection.where.forEach((range, index) => {
    const at = `${path}.where.${index}`;
    checkReference(evidence, 'quantities', range.quantity, `${at}.quantity`, fields);
    checkRange(range, at, fields);
  });
}

/** One side of a claim. */
export function checkValueReference(
  evidence: Evidence,
  reference: ValueReference,
  path: string,
  fields: Fields,
): void {
  const check = (table: DefinitionTable | 'trials', id: string | undefined, name: string) => {
    if (id !== undefined) checkReference(evidence, table, id, `${path}.${name}`, fields);
  };
  switch (reference.kind) {
    case 'difference':
      checkValueReference(evidence, reference.a, `${path}.a`, fields);
      checkValueReference(evidence, reference.b, `${path}.b`, fields);
      return;
    case 'prediction':
      check('models', reference.model, 'model');
      break;
    case 'reading':
      check('trials', reference.trial, 'trial');
      break;
    case 'fit':
    case 'count':
      check('comparisons', reference.comparison, 'comparison');
      break;
    case 'claim':
      check('claims', reference.claim, 'claim');
      break;
    default:
  }
  if ('quantity' in reference) check('quantities', reference.quantity, 'quantity');
  if ('series' in reference) check('series', reference.series, 'series');
  if ('at' in reference) checkReadings(reference.at, `${path}.at`, fields);
}
