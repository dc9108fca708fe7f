import type { Evidence } from '#shared/evidence/evidence.ts';
import type { DefinitionTable } from '#shared/contracts/evidence.ts';

/** What in the evidence points at a row, in words ("model 2", "series B"), the row itself left out. */
export function findUses(evidence: Evidence, table: DefinitionTable, id: string): string[] {
  const others = <Row extends { readonly id: string }>(name: DefinitionTable, rows: readonly Row[]) =>
    rows.filter((row) => !(name === table && row.id === id) && mentions(row, id));
  const trials = evidence.trials.filter((trial) => mentions(trial, id));
  return [
    ...others('quantities', evidence.quantities).map(({ symbol }) => `quantity ${symbol}`),
    ...others('series', evidence.series).map(({ letter }) => `series ${letter}`),
    ...(trials.length === 0 ? [] : [trials.length === 1 ? '1 trial' : `${trials.length} trials`]),
    ...others('models', evidence.models).map(({ n }) => `model ${n}`),
    ...others('comparisons', evidence.comparisons).map(({ name }) => `comparison ${name}`),
    ...others('claims', evidence.claims).map(({ n }) => `claim ${n}`),
    ...others('charts', evidence.charts).map(({ n }) => `chart ${n}`),
  ];
}

/** Ids are unique in a problem, so a row uses another when its id stands anywhere in it, in expressions in braces. */
function mentions(value: unknown, id: string): boolean {
  if (typeof value === 'string') return value === id || value.includes(`{${id}}`);
  if (Array.isArray(value)) return value.some((part) => mentions(part, id));
  if (typeof value !== 'object' || value === null) return false;
  return Object.entries(value).some(([key, part]) => key === id || mentions(part, id));
}
