/** The table of a series as it stands in a report: one row a trial, grouped by setting, with means. */
import type { Evidence } from '#shared/evidence/evidence.ts';
import type { Findings } from '#shared/evidence/findings.ts';

export interface TrialsTableColumn {
  readonly quantity: string;
  readonly symbol: string;
  readonly name: string;
  /** Unit in the head, typeset: "cm", "m s⁻²"; empty for a pure number. */
  readonly unit: string;
  readonly kind: 'setting' | 'reading';
}

export interface TrialsTableRow {
  readonly trial: string;
  /** "B12". */
  readonly name: string;
  /** Text of each column, in the head's unit; empty: not logged. */
  readonly cells: readonly string[];
  readonly excluded: string | null;
}

export interface TrialsTableGroup {
  readonly key: string;
  readonly rows: readonly TrialsTableRow[];
  /** Mean of each reading, "46.4 ± 0.4", in the order of the reading columns; null: no kept trial. */
  readonly means: readonly (string | null)[];
}

export interface TrialsTableView {
  readonly letter: string;
  readonly name: string;
  /** "held: h = 20.0 cm". */
  readonly held: string | null;
  readonly columns: readonly TrialsTableColumn[];
  readonly groups: readonly TrialsTableGroup[];
  readonly excluded: number;
}

/** Null: the series is gone. */
export function trialsTable(
  _series: string,
  _evidence: Evidence,
  _findings: Findings,
): TrialsTableView | null {
  throw new Error('trialsTable: not written');
}
