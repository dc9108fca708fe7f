import type { Evaluation } from './evaluation.ts';
import type { Range, Selection } from './evidence.ts';
import { checkedReading } from './constant-value.ts';
import { isFault } from './fault.ts';
import type { Fault } from './findings.ts';
import { registerValue } from './register-value.ts';
import { symbolName } from './register.ts';
import { trialIds } from './series-trials.ts';
import { rowOf, type Term, type Uncertain } from './uncertain.ts';

/** One selected trial and its row in the columns of its series. */
export interface Pick {
  readonly id: string;
  readonly series: string;
  readonly row: number;
}

/** A range in SI; an absent end is infinite. */
export interface SiRange {
  readonly quantity: string;
  readonly min: number;
  readonly max: number;
}

/** A range in SI, or the end of it that cannot be read. */
export function siRange(run: Evaluation, range: Range, at: string): SiRange | Fault {
  const quantity = run.register.quantities.get(range.quantity);
  const symbol = symbolName(run.register, range.quantity);
  if (quantity === undefined)
    return {
      shape: 'fault',
      code: 'source gone',
      sentence: 'A range is about a quantity that is gone. Remove it.',
      at,
    };
  const ends = [range.min, range.max].map((end) =>
    end === null
      ? null
      : checkedReading(run.register, end, quantity, { words: () => `The range of ${symbol}`, at }),
  );
  const [min, max] = ends;
  if (min && 'shape' in min) return min;
  if (max && 'shape' in max) return max;
  return { quantity: range.quantity, min: min?.value ?? -Infinity, max: max?.value ?? Infinity };
}

/** Whether a value lies in a range, both ends included. */
export function inRange(value: number, { min, max }: SiRange): boolean {
  return value >= min && value <= max;
}

/** The selected trials, excluded ones among them, in the order of the selection. */
export function selectTrials(run: Evaluation, selection: Selection, at: string): readonly Pick[] | Fault {
  const picks: Pick[] = [];
  const rows = (series: string): readonly Pick[] =>
    trialIds(run, series).map((id, row) => ({ id, series, row }));
  for (const series of new Set(selection.series)) picks.push(...rows(series));
  const known = new Set(picks.map(({ id }) => id));
  for (const id of new Set(selection.plusTrials)) {
    const series = run.register.trials.get(id)?.series;
    const row = series === undefined ? -1 : trialIds(run, series).indexOf(id);
    if (series !== undefined && row >= 0 && !known.has(id)) picks.push({ id, series, row });
  }
  return withinRanges(run, picks, selection.where, at);
}

function withinRanges(
  run: Evaluation,
  picks: readonly Pick[],
  where: readonly Range[],
  at: string,
): readonly Pick[] | Fault {
  let inside = picks;
  for (const range of where) {
    const si = siRange(run, range, at);
    if (isFault(si)) return si;
    inside = inside.filter(({ series, row }) => {
      const value = registerValue(run, si.quantity, series);
      return !isFault(value) && inRange(rowOf(value.values, row), si);
    });
  }
  return inside;
}

/** A register quantity over picked trials: one value where it is the same for all, else one for each. */
export function gather(run: Evaluation, id: string, picks: readonly Pick[]): Uncertain | Fault {
  const bySeries = new Map<string, Uncertain>();
  for (const { series } of picks) {
    if (bySeries.has(series)) continue;
    const value = registerValue(run, id, series);
    if (isFault(value)) return value;
    bySeries.set(series, value);
  }
  const different = new Set(bySeries.values());
  const [only] = different;
  if (only !== undefined && different.size === 1 && isWhole(only, picks)) return only;
  return pickRows(picks.map(({ series, row }) => ({ from: bySeries.get(series) ?? only, row })));
}

/** Whether a value serves all picks as it is: one value, or a column whose every row is picked in order. */
function isWhole({ values }: Uncertain, picks: readonly Pick[]): boolean {
  return values.length === 1 || (values.length === picks.length && picks.every(({ row }, i) => row === i));
}

interface PickedRow {
  readonly from: Uncertain | undefined;
  readonly row: number;
}

/** One column from rows of several. */
export function pickRows(rows: readonly PickedRow[]): Uncertain {
  const n = rows.length;
  const values = new Float64Array(n);
  const terms = new Map<string, { source: string; kind: Term['kind']; c: Float64Array }>();
  rows.forEach(({ from, row }, i) => {
    values[i] = from === undefined ? NaN : rowOf(from.values, row);
    for (const { source, kind, c } of from?.terms ?? []) {
      const key = `${kind}:${source}`;
      let term = terms.get(key);
      if (term === undefined) terms.set(key, (term = { source, kind, c: new Float64Array(n) }));
      term.c[i] = rowOf(c, row);
    }
  });
  const origins = rows.map(({ from }) => from);
  return {
    values,
    terms: [...terms.values()],
    known: origins.some((from) => from?.known === true),
    hue: origins.some((from) => from?.hue === 'predicted') ? 'predicted' : 'measured',
  };
}
