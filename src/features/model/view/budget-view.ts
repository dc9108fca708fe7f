import type { Evidence, Quantity, Reading } from '#shared/evidence/evidence.ts';
import { findSource } from '#shared/evidence/find-source.ts';
import type { Findings, Scalar } from '#shared/evidence/findings.ts';
import { uncertaintyBudget } from '#shared/uncertainty/uncertainty-budget.ts';

/** One line of an uncertainty budget: an independent source and its share of u². */
export interface BudgetRow {
  readonly key: string;
  /** The quantity that the source belongs to, where it belongs to one. */
  readonly quantity: Quantity | null;
  /** "fit to series A", "steel rule, common to all". */
  readonly words: string;
  /** What was held fixed, where the source is a setting of a whole series. */
  readonly held: Reading | null;
  readonly share: number;
}

/** Rows of a value's budget, largest share first; sources told in the same words are one row. */
export function budgetRows(scalar: Scalar, evidence: Evidence, findings: Findings): BudgetRow[] {
  const rows = new Map<string, BudgetRow>();
  for (const { source, share } of uncertaintyBudget(scalar.parts)) {
    const { words } = findSource(findings, evidence, source);
    const quantity = quantityOfSource(source, evidence);
    const key = `${quantity?.id ?? ''} ${words}`;
    const before = rows.get(key);
    rows.set(key, {
      key,
      quantity,
      words,
      held: heldReading(source, evidence),
      share: share + (before?.share ?? 0),
    });
  }
  return [...rows.values()].sort((a, b) => b.share - a.share);
}

/** Sources are named after what they come from: `const:q:0`, `fit:c:0`, `trial:t:q`, `mean:q@s{…}`, `inst:i:offset`. */
function quantityOfSource(source: string, evidence: Evidence): Quantity | null {
  const find = (id: string | undefined) => evidence.quantities.find((quantity) => quantity.id === id) ?? null;
  const [kind = '', first, second] = source.split(':');
  switch (kind) {
    case 'const':
      return find(first);
    case 'trial':
    case 'held':
    case 'set':
      return find(second) ?? find(first);
    case 'mean':
      return find(source.slice('mean:'.length).split('@')[0]);
    case 'fit': {
      const free = evidence.comparisons.find(({ id }) => id === first)?.free ?? [];
      return free.length === 1 ? find(free[0]?.quantity) : null;
    }
    default:
      return null;
  }
}

function heldReading(source: string, evidence: Evidence): Reading | null {
  const [kind, series, quantity = ''] = source.split(':');
  if (kind !== 'held') return null;
  return evidence.series.find(({ id }) => id === series)?.held[quantity] ?? null;
}
