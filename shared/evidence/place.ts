import { at } from '#shared/numeric/element.ts';
import { fault, isFault } from './fault.ts';
import type { Column, Fault, Group, Scalar } from './findings.ts';
import { meanOfRows } from './mean-of-group.ts';
import { seriesName, symbolName } from './register.ts';
import type { KnownValues } from './scope.ts';
import { uncertainValue, type Term, type Uncertain } from './uncertain.ts';
import type { Values } from './values.ts';

/** A setting of a series: one that was logged, as a group, or one that is only asked for. */
export interface Place {
  readonly series: string;
  /** Values of what is set. */
  readonly set: ReadonlyMap<string, Uncertain>;
  /** The group whose readings stand in for what the model needs besides; null: there are none. */
  readonly group: Group | null;
}

/** A scalar finding on its way back into a computation. */
export function uncertainOf({ value, parts, u, hue }: Scalar): Uncertain {
  return uncertainValue(value, parts, u !== null, hue);
}

/** The place of a group: its settings with the uncertainty of one setting, not divided by the number of trials. */
export function placeOfGroup(values: Values, group: Group): Place {
  const set = new Map<string, Uncertain>();
  for (const id of Object.keys(group.settings)) {
    const column = values.finding(id, group.series);
    if (column.shape === 'column') set.set(id, settingOf(column, group, `set:${id}@${group.key}`));
    if (column.shape === 'scalar') set.set(id, uncertainOf(column));
  }
  return { series: group.series, set, group };
}

/**
 * One setting of a group: the value, the mean square of its readings' own u as one error, and what is common.
 *
 * @param source - name of the setting's own error
 */
export function settingOf(column: Column, group: Group, source: string): Uncertain {
  const rows = rowsOf(column, group.kept.length > 0 ? group.kept : group.excluded);
  let squares = 0;
  for (const row of rows) squares += at(column.own, row) ** 2;
  const own = rows.length === 0 ? 0 : Math.sqrt(squares / rows.length);
  const first = rows[0];
  const terms: Term[] = own > 0 ? [{ source, kind: 'shared', c: Float64Array.of(own) }] : [];
  if (first !== undefined)
    for (const { source: common, c } of column.shared)
      if (at(c, first) !== 0)
        terms.push({ source: common, kind: 'shared', c: Float64Array.of(at(c, first)) });
  return {
    values: Float64Array.of(first === undefined ? NaN : at(column.values, first)),
    terms,
    known: terms.length > 0,
    hue: column.hue,
  };
}

const rowTables = new WeakMap<readonly string[], ReadonlyMap<string, number>>();

/** Rows of a column by the ids of trials; trials that are not in it are left out. */
export function rowsOf(column: Column, trials: readonly string[]): number[] {
  let table = rowTables.get(column.trials);
  if (table === undefined)
    rowTables.set(column.trials, (table = new Map(column.trials.map((id, row) => [id, row]))));
  const rows: number[] = [];
  for (const id of trials) {
    const row = table.get(id);
    if (row !== undefined) rows.push(row);
  }
  return rows;
}

/** Rows of a group that have a value in a column. */
export function rowsWithValue(column: Column, trials: readonly string[]): number[] {
  return rowsOf(column, trials).filter((row) => Number.isFinite(at(column.values, row)));
}

/**
 * What is known at a place without any equation. Quantities that are computed from trial to trial are not: they
 * are computed from the place's own values.
 */
export function knownAtPlace(values: Values, place: Place): KnownValues {
  return (quantity) => {
    const set = place.set.get(quantity);
    if (set !== undefined) return set;
    const origin = values.register.quantities.get(quantity)?.def.origin;
    const computed = origin === 'derived' || origin === 'predicted';
    const finding = values.finding(quantity, place.series);
    if (finding.shape === 'scalar') return uncertainOf(finding);
    if (computed) return null;
    return isFault(finding) ? finding : readingAt(values, place, quantity, finding);
  };
}

function readingAt(values: Values, place: Place, quantity: string, column: Column): Uncertain | Fault {
  const symbol = symbolName(values.register, quantity);
  const rows = place.group === null ? [] : rowsWithValue(column, place.group.kept);
  if (place.group === null || rows.length === 0)
    return fault(
      'missing input',
      `${symbol} is read trial by trial in ${seriesName(values.register, place.series)}. Say at which value of ${symbol}.`,
      quantity,
    );
  const source = `mean:${quantity}@${place.group.key}`;
  return uncertainOf(meanOfRows({ column, rows, leftOut: [], source }, (id) => values.freedomOf(id)));
}
