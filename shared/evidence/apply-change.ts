import type { EvidenceChange } from './evidence-change.ts';
import type { Evidence } from './evidence.ts';

interface Row {
  readonly id: string;
}

/**
 * Evidence after one committed step. Untouched tables and rows stay the very same objects, so that evaluation
 * with a cache computes anew only what the step can have changed. A new row goes to the end of its table.
 *
 * @param evidence - before the step; not modified
 * @param changes - the step's changes, in order
 * @param version - version after the step
 */
export function applyStep(evidence: Evidence, changes: readonly EvidenceChange[], version: number): Evidence {
  const after: Evidence = { ...evidence, version };
  for (const table of new Set(changes.map((change) => change.table))) {
    const own = changes.filter((change) => change.table === table);
    if (table === 'settings') after.settings = lastSettings(own) ?? after.settings;
    else Object.assign(after, { [table]: withRows<Row>(evidence[table], own) });
  }
  return after;
}

function lastSettings(changes: readonly EvidenceChange[]): Evidence['settings'] | undefined {
  const last = changes.at(-1);
  return last?.table === 'settings' ? last.row : undefined;
}

function withRows<T extends Row>(rows: readonly T[], changes: readonly EvidenceChange[]): T[] {
  const next = new Map<string, unknown>();
  for (const change of changes) if (change.table !== 'settings') next.set(change.id, change.row);
  const kept: T[] = [];
  for (const row of rows) {
    const changed = next.get(row.id);
    if (!next.has(row.id)) kept.push(row);
    else if (changed !== null) kept.push(changed as T);
    next.delete(row.id);
  }
  for (const added of next.values()) if (added !== null) kept.push(added as T);
  return kept;
}
