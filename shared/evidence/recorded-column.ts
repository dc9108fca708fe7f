import { at, item } from '#shared/numeric/element.ts';
import type { Quantity, Reading, Trial } from './evidence.ts';
import { checkedReading, partsOfInstrument } from './constant-value.ts';
import type { Fault } from './findings.ts';
import { amountOf, ownUncertainty, type StatedPart } from './instrument-parts.ts';
import { symbolName, trialName, type Register } from './register.ts';
import { rowOf, type Term, type Uncertain } from './uncertain.ts';

/** A quantity as the trials of a series carry it. */
export interface RecordedColumn {
  readonly trials: readonly Trial[];
  readonly uncertain: Uncertain;
  /** u of each reading, and the part of it that scatter does not contain. */
  readonly own: Float64Array;
  readonly apart: Float64Array;
  /** Rows that could not be read, with the fault. */
  readonly faults: ReadonlyMap<number, Fault>;
}

/** What a column is made from. */
export interface ColumnOrigin {
  readonly quantity: Quantity;
  readonly instrument: string | null;
  readonly trials: readonly Trial[];
  /** Stands where a trial has no reading of its own; null: nothing does. */
  readonly fallback: Uncertain | null;
}

/**
 * Reads a column, row by row; rows that are as they were in `earlier` are copied from it. The earlier column
 * itself is returned when no row differs.
 */
export function recordedColumn(
  register: Register,
  origin: ColumnOrigin,
  earlier: RecordedColumn | undefined,
): RecordedColumn | Fault {
  const { quantity, trials } = origin;
  const parts = partsOfInstrument(register, origin.instrument, quantity);
  if ('shape' in parts) return parts;
  const n = trials.length;
  const [values, own, apart] = [new Float64Array(n), new Float64Array(n), new Float64Array(n)];
  const faults = new Map<number, Fault>();
  let fresh = earlier === undefined || earlier.trials.length !== n;
  trials.forEach((trial, row) => {
    const before = earlier?.trials[row];
    if (earlier !== undefined && before !== undefined && sameCell(before, trial, quantity.id)) {
      values[row] = at(earlier.uncertain.values, row);
      own[row] = at(earlier.own, row);
      apart[row] = at(earlier.apart, row);
      const known = earlier.faults.get(row);
      if (known !== undefined) faults.set(row, known);
      return;
    }
    fresh = true;
    const cell = readCell(register, origin, parts, trial);
    if ('shape' in cell) faults.set(row, cell);
    values[row] = 'shape' in cell ? NaN : cell.value;
    own[row] = 'shape' in cell ? 0 : cell.own;
    apart[row] = 'shape' in cell ? 0 : cell.apart;
  });
  if (!fresh && earlier !== undefined) return earlier;
  const uncertain: Uncertain = {
    values,
    terms: columnTerms(origin, parts, { values, own, apart }),
    known: own.some((u) => u > 0) || apart.some((u) => u > 0) || parts.some(({ shared }) => shared),
    hue: 'measured',
  };
  return { trials, uncertain, own, apart, faults };
}

interface Cell {
  readonly value: number;
  readonly own: number;
  readonly apart: number;
}

function readCell(
  register: Register,
  { quantity, fallback }: ColumnOrigin,
  parts: readonly StatedPart[],
  trial: Trial,
): Cell | Fault {
  const reading = trial.values[quantity.id];
  if (reading === undefined)
    return { value: fallback === null ? NaN : rowOf(fallback.values, 0), own: 0, apart: 0 };
  const words = (): string => `${symbolName(register, quantity.id)} of ${trialName(register, trial.id)}`;
  const read = checkedReading(register, reading, quantity, { words, at: trial.id });
  if ('shape' in read) return read;
  if (read.u !== null) return { value: read.value, own: read.u, apart: 0 };
  return {
    value: read.value,
    own: ownUncertainty(parts, read.value, false),
    apart: ownUncertainty(parts, read.value, true),
  };
}

function columnTerms(
  { quantity, instrument, trials, fallback }: ColumnOrigin,
  parts: readonly StatedPart[],
  { values, own, apart }: { values: Float64Array; own: Float64Array; apart: Float64Array },
): Term[] {
  const terms: Term[] = [];
  const has = trials.map((trial) => trial.values[quantity.id] !== undefined);
  const complete = has.every(Boolean);
  if (own.some((u) => u !== 0)) terms.push({ source: quantity.id, kind: 'own', c: own });
  if (apart.some((u) => u !== 0)) terms.push({ source: quantity.id, kind: 'apart', c: apart });
  for (const part of parts) {
    if (!part.shared) continue;
    const everywhere = complete && !part.relative;
    const c = everywhere
      ? Float64Array.of(part.amount)
      : values.map((value, row) => (item(has, row) ? amountOf(part, value) : 0));
    terms.push({ source: `inst:${instrument ?? ''}:${part.name}`, kind: 'shared', c });
  }
  return complete || fallback === null ? terms : withFallback(terms, fallback, has);
}

/** Rows without a reading follow the sources of the value that stands in for it. */
function withFallback(terms: readonly Term[], fallback: Uncertain, has: readonly boolean[]): Term[] {
  const all = new Map(terms.map((term) => [`${term.kind}:${term.source}`, term]));
  for (const { source, c } of fallback.terms) {
    const own = all.get(`shared:${source}`)?.c;
    const merged = Float64Array.from(has, (known, row) =>
      known ? (own === undefined ? 0 : rowOf(own, row)) : rowOf(c, 0),
    );
    all.set(`shared:${source}`, { source, kind: 'shared', c: merged });
  }
  return [...all.values()];
}

function sameCell(before: Trial, now: Trial, quantity: string): boolean {
  if (before === now) return true;
  return before.id === now.id && sameReading(before.values[quantity], now.values[quantity]);
}

/** Whether two readings were typed alike. */
export function sameReading(a: Reading | undefined, b: Reading | undefined): boolean {
  return (
    a === b || (a !== undefined && b !== undefined && a.text === b.text && a.unit === b.unit && a.u === b.u)
  );
}
