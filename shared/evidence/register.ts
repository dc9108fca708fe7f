import type { NamedSymbol } from '#shared/expressions/expression.ts';
import { symbolToText } from '#shared/formatting/symbol.ts';
import type { Claim, Comparison, Evidence, Instrument, Model, Quantity, Series, Trial } from './evidence.ts';

/** Rows of a problem by id, and the names people know them by. */
export interface Register {
  readonly evidence: Evidence;
  readonly quantities: ReadonlyMap<string, Quantity>;
  readonly instruments: ReadonlyMap<string, Instrument>;
  readonly series: ReadonlyMap<string, Series>;
  readonly trials: ReadonlyMap<string, Trial>;
  readonly models: ReadonlyMap<string, Model>;
  readonly comparisons: ReadonlyMap<string, Comparison>;
  readonly claims: ReadonlyMap<string, Claim>;
  /** What an expression may name. The same array as long as the table of quantities is the same. */
  readonly symbols: readonly NamedSymbol[];
}

const registers = new WeakMap<Evidence, Register>();
const tables = new WeakMap<readonly object[], ReadonlyMap<string, never>>();
const symbolTables = new WeakMap<readonly Quantity[], readonly NamedSymbol[]>();

/** The register of some evidence; made once for each table that changed. */
export function registerOf(evidence: Evidence): Register {
  const known = registers.get(evidence);
  if (known !== undefined) return known;
  const register: Register = {
    evidence,
    quantities: byId(evidence.quantities),
    instruments: byId(evidence.instruments),
    series: byId(evidence.series),
    get trials() {
      return byId(evidence.trials);
    },
    models: byId(evidence.models),
    comparisons: byId(evidence.comparisons),
    claims: byId(evidence.claims),
    symbols: symbolsOf(evidence.quantities),
  };
  registers.set(evidence, register);
  return register;
}

function byId<T extends { id: string }>(rows: readonly T[]): ReadonlyMap<string, T> {
  const known = tables.get(rows);
  if (known !== undefined) return known;
  const table = new Map(rows.map((row) => [row.id, row]));
  tables.set(rows, table as unknown as ReadonlyMap<string, never>);
  return table;
}

function symbolsOf(quantities: readonly Quantity[]): readonly NamedSymbol[] {
  const known = symbolTables.get(quantities);
  if (known !== undefined) return known;
  const symbols = quantities.map(({ id, symbol }) => ({ id, symbol }));
  symbolTables.set(quantities, symbols);
  return symbols;
}

/** "B12"; "a trial that is gone" where there is none. */
export function trialName(register: Register, id: string): string {
  const trial = register.trials.get(id);
  if (trial === undefined) return 'a trial that is gone';
  return `${register.series.get(trial.series)?.letter ?? ''}${trial.number}`;
}

/** "C_v" as it is shown in plain text; "a quantity that is gone" where there is none. */
export function symbolName(register: Register, id: string): string {
  const quantity = register.quantities.get(id);
  return quantity === undefined ? 'a quantity that is gone' : symbolToText(quantity.symbol);
}

/** "series B". */
export function seriesName(register: Register, id: string): string {
  const series = register.series.get(id);
  return series === undefined ? 'a series that is gone' : `series ${series.letter}`;
}

/** "model 3". */
export function modelName(register: Register, id: string): string {
  const model = register.models.get(id);
  return model === undefined ? 'a model that is gone' : `model ${model.n}`;
}
