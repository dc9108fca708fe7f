/** The table of a series as it stands in a report: trials in groups of equal settings, the mean once per group. */
import type { Evidence, Quantity, Series, Trial } from '#shared/evidence/evidence.ts';
import { isFault } from '#shared/evidence/fault.ts';
import { findValue } from '#shared/evidence/find-value.ts';
import type { Findings, Group } from '#shared/evidence/findings.ts';
import { registerOf, type Register } from '#shared/evidence/register.ts';
import { formatScalar } from '#shared/formatting/format-scalar.ts';
import { symbolToText } from '#shared/formatting/symbol.ts';
import { unitToText } from '#shared/formatting/unit-text.ts';
import { fromSi, uncertaintyFromSi } from '#shared/units/convert.ts';
import { parseUnit } from '#shared/units/parse-unit.ts';
import { readingFigures, readingText } from './reading-text.ts';
import { trialFigure } from './trial-figure.ts';

/** One column; its head reads "quantity / unit". */
export interface TrialsTableColumn {
  readonly quantity: string;
  readonly symbol: string;
  readonly name: string;
  /** Unit in the head, typeset: "cm", "m s⁻²"; empty for a pure number. */
  readonly unit: string;
  readonly kind: 'setting' | 'reading';
}

/** One trial. */
export interface TrialsTableRow {
  readonly trial: string;
  /** "B12". */
  readonly name: string;
  /** Text of each column, in the head's unit; empty: not logged. */
  readonly cells: readonly string[];
  /** Why it is left out; null: it is not. */
  readonly excluded: string | null;
}

/** Trials with equal settings. */
export interface TrialsTableGroup {
  readonly key: string;
  readonly rows: readonly TrialsTableRow[];
  /** Mean of each reading, "46.4 ± 0.4", in the order of the reading columns; null: none can be had. */
  readonly means: readonly (string | null)[];
}

/** A series as a table. */
export interface TrialsTableView {
  readonly letter: string;
  readonly name: string;
  /** What is held fixed: "h = 20.0 cm"; null: nothing. */
  readonly held: string | null;
  readonly columns: readonly TrialsTableColumn[];
  readonly groups: readonly TrialsTableGroup[];
  readonly trials: number;
  readonly excluded: number;
}

/**
 * A series as a table; trials that were taken back are not in it.
 *
 * @returns null when the series is gone
 */
export function trialsTable(series: string, evidence: Evidence, findings: Findings): TrialsTableView | null {
  const register = registerOf(evidence);
  const row = register.series.get(series);
  if (row === undefined) return null;
  const columns = columnsOf(row, register);
  const groups = (findings.groups.get(series) ?? []).map((group) =>
    tableGroup(group, row, columns, evidence, findings),
  );
  const rows = groups.flatMap((group) => group.rows);
  return {
    letter: row.letter,
    name: row.name,
    held: heldWords(row, register),
    columns,
    groups,
    trials: rows.length,
    excluded: rows.filter(({ excluded }) => excluded !== null).length,
  };
}

function columnsOf(series: Series, register: Register): readonly TrialsTableColumn[] {
  const column = (kind: TrialsTableColumn['kind']) => (id: string) => {
    const quantity: Quantity | undefined = register.quantities.get(id);
    if (quantity === undefined) return [];
    const { symbol, name, unit } = quantity;
    return [{ quantity: id, symbol, name, unit: unit === '1' ? '' : unitToText(unit), kind }];
  };
  return [...series.settings.flatMap(column('setting')), ...series.readings.flatMap(column('reading'))];
}

function tableGroup(
  group: Group,
  series: Series,
  columns: readonly TrialsTableColumn[],
  evidence: Evidence,
  findings: Findings,
): TrialsTableGroup {
  const register = registerOf(evidence);
  const trials = [...group.kept, ...group.excluded]
    .flatMap((id) => register.trials.get(id) ?? [])
    .sort((a, b) => a.number - b.number);
  return {
    key: group.key,
    rows: trials.map((trial) => ({
      trial: trial.id,
      name: `${series.letter}${trial.number}`,
      cells: columns.map(({ quantity }) => cell(trial, quantity, evidence, findings)),
      excluded: trial.excluded?.reason ?? null,
    })),
    means: columns
      .filter(({ kind }) => kind === 'reading')
      .map(({ quantity }) => meanText(quantity, group, evidence, findings)),
  };
}

function cell(trial: Trial, quantity: string, evidence: Evidence, findings: Findings): string {
  const typed = trial.values[quantity];
  const unit = registerOf(evidence).quantities.get(quantity)?.unit ?? '1';
  if (typed === undefined) return '';
  if (typed.unit === unit) return readingFigures(typed);
  return trialFigure(trial.id, quantity, unit, evidence, findings)?.text ?? readingText(typed);
}

function meanText(quantity: string, group: Group, evidence: Evidence, findings: Findings): string | null {
  const { series, settings } = group;
  const mean = findValue(findings, evidence, { kind: 'mean', quantity, series, at: { ...settings } });
  if (isFault(mean)) return null;
  const parsed = parseUnit(mean.unit);
  if (!parsed.ok) return null;
  const inUnit = {
    value: fromSi(mean.value, parsed.unit),
    u: mean.u === null ? null : uncertaintyFromSi(mean.u, parsed.unit),
  };
  return formatScalar(inUnit, '1', evidence.settings.rounding);
}

function heldWords(series: Series, register: Register): string | null {
  const held = Object.entries(series.held).map(([id, reading]) => {
    const symbol = register.quantities.get(id)?.symbol ?? '?';
    return `${symbolToText(symbol)} = ${readingText(reading)}`;
  });
  return held.length === 0 ? null : held.join(', ');
}
