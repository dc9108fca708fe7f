import { parsedExpression, compileEquation } from './compiled-expression.ts';
import { singleValue } from './constant-value.ts';
import { findCycles } from './cycles.ts';
import { directDependencies, dependentName, type Dependent } from './dependencies.ts';
import { sameItems, type Evaluation, type Solved } from './evaluation.ts';
import type { Quantity } from './evidence.ts';
import { fault, isFault } from './fault.ts';
import type { Fault } from './findings.ts';
import { recordedColumn, type RecordedColumn } from './recorded-column.ts';
import { seriesName, symbolName } from './register.ts';
import { createScope, equationValue } from './scope.ts';
import { seriesColumns, seriesTrials } from './series-trials.ts';
import type { Uncertain } from './uncertain.ts';
import { findVariations, type Variation } from './variation.ts';

/**
 * The value of a register quantity, inside a series or outside of all: a trial's own value first, then what the
 * series holds, then the constant; else what its definition gives.
 */
export function registerValue(run: Evaluation, id: string, series: string | null): Uncertain | Fault {
  const quantity = run.register.quantities.get(id);
  if (quantity === undefined) return fault('source gone', 'The quantity is gone. Choose another.', id);
  const { needsSeries, differsBySeries } = variationOf(run, id);
  const place = differsBySeries ? series : null;
  switch (quantity.def.origin) {
    case 'recorded':
    case 'constant':
      return enteredValue(run, quantity, series);
    case 'fitted':
    case 'summary': {
      const solved = solvedValue(run, quantity);
      return isFault(solved) ? solved : solved.uncertain;
    }
    default:
      if (needsSeries && series === null) return noSingleValue(run, quantity);
      return cycleOf(run, id) ?? computedValue(run, quantity, place);
  }
}

/** What a fit or a statistic gives for a quantity. */
export function solvedValue(run: Evaluation, quantity: Quantity): Solved | Fault {
  const cycle = cycleOf(run, quantity.id);
  if (cycle !== null) return cycle;
  return quantity.def.origin === 'fitted'
    ? run.solvers.fitted(run, quantity)
    : run.solvers.summary(run, quantity);
}

/** The fault of a quantity that is defined through itself; null when it is not. */
export function cycleOf(run: Evaluation, name: string): Fault | null {
  const { quantities, models, comparisons } = run.evidence;
  const cycles = run.node(
    'cycles',
    () => [quantities, models, comparisons],
    () => findCycles(run.register),
  );
  return cycles.get(name) ?? null;
}

/** Symbols and units of the register; the same object while none changes. */
export function registerNames(run: Evaluation): readonly string[] {
  return run.node<readonly string[]>(
    'names',
    () => [run.evidence.quantities],
    (earlier) => {
      const names = run.evidence.quantities.map(({ id, symbol, unit }) => `${id} ${symbol} ${unit}`);
      return earlier !== undefined && sameItems(earlier.value, names) ? earlier.value : names;
    },
  );
}

/** How a quantity's value depends on where one stands. */
export function variationOf(run: Evaluation, id: string): Variation {
  const { quantities, models, series } = run.evidence;
  const bySeries = run.node<readonly string[]>(
    'by series',
    () => [series, ...series.map((row) => seriesColumns(run, row.id))],
    (earlier) => {
      const ids = new Set(series.flatMap((row) => [...Object.keys(row.held), ...seriesColumns(run, row.id)]));
      return earlier !== undefined && sameItems(earlier.value, [...ids]) ? earlier.value : [...ids];
    },
  );
  const variations = run.node(
    'variations',
    () => [quantities, models, bySeries],
    () => findVariations(run.register, new Set(bySeries)),
  );
  return variations.get(id) ?? { needsSeries: false, differsBySeries: false };
}

function noSingleValue(run: Evaluation, quantity: Quantity): Fault {
  const symbol = symbolName(run.register, quantity.id);
  const how = quantity.def.origin === 'recorded' ? 'is read trial by trial' : 'differs from trial to trial';
  return fault('no single value', `${symbol} ${how}. Name a series and a setting.`, quantity.id);
}

/** A quantity that people enter: in trials, held by a series, or once. */
function enteredValue(run: Evaluation, quantity: Quantity, series: string | null): Uncertain | Fault {
  if (series === null) {
    return quantity.def.origin === 'constant' ? constantValue(run, quantity) : noSingleValue(run, quantity);
  }
  if (seriesColumns(run, series).has(quantity.id)) {
    const column = columnOf(run, quantity, series);
    return isFault(column) ? column : column.uncertain;
  }
  return heldValue(run, quantity, series) ?? unread(run, quantity, series);
}

/** What stands where trials say nothing: the constant, or that there is nothing. */
function unread(run: Evaluation, quantity: Quantity, series: string): Uncertain | Fault {
  if (quantity.def.origin === 'constant') return constantValue(run, quantity);
  return fault(
    'missing input',
    `${symbolName(run.register, quantity.id)} is neither read nor held in ${seriesName(run.register, series)}.`,
    series,
  );
}

function instrumentOf({ def }: Quantity): string | null {
  return def.origin === 'recorded' || def.origin === 'constant' ? (def.instrument ?? null) : null;
}

function constantValue(run: Evaluation, quantity: Quantity): Uncertain | Fault {
  const { def } = quantity;
  const instrument = instrumentOf(quantity);
  return run.node(
    `constant:${quantity.id}`,
    () => [quantity, instrument === null ? null : run.register.instruments.get(instrument)],
    () => {
      if (def.origin !== 'constant' || def.reading === null)
        return fault(
          'not measured',
          `${symbolName(run.register, quantity.id)} is named, but not measured. Enter its value.`,
          quantity.id,
        );
      const source = `const:${quantity.id}`;
      return singleValue(run.register, {
        reading: def.reading,
        quantity,
        instrument,
        parts: def.parts,
        source,
        at: quantity.id,
      });
    },
  );
}

function heldValue(run: Evaluation, quantity: Quantity, series: string): Uncertain | Fault | null {
  const reading = run.register.series.get(series)?.held[quantity.id];
  if (reading === undefined) return null;
  const instrument = instrumentOf(quantity);
  return run.node<Uncertain | Fault>(
    `held:${quantity.id}@${series}`,
    () => [reading, quantity, instrument === null ? null : run.register.instruments.get(instrument)],
    () => {
      const source = `held:${series}:${quantity.id}`;
      return singleValue(run.register, { reading, quantity, instrument, parts: [], source, at: series });
    },
  );
}

/** A column as the trials of a series carry it, in the order of the trials. */
export function columnOf(run: Evaluation, quantity: Quantity, series: string): RecordedColumn | Fault {
  const trials = seriesTrials(run, series);
  const instrument = instrumentOf(quantity);
  const standIn =
    heldValue(run, quantity, series) ??
    (quantity.def.origin === 'constant' ? constantValue(run, quantity) : null);
  const fallback = standIn === null || isFault(standIn) ? null : standIn;
  const fixed = [quantity, instrument === null ? null : run.register.instruments.get(instrument), fallback];
  return run.node<RecordedColumn | Fault>(
    `column:${quantity.id}@${series}`,
    () => [...fixed, trials],
    (earlier) => {
      const same =
        earlier !== undefined &&
        !isFault(earlier.value) &&
        sameItems(earlier.inputs.slice(0, fixed.length), fixed);
      const before = same && !isFault(earlier.value) ? earlier.value : undefined;
      return recordedColumn(run.register, { quantity, instrument, trials, fallback }, before);
    },
  );
}

/** A quantity computed by an expression or a model, from the values its inputs have in the same place. */
function computedValue(run: Evaluation, quantity: Quantity, series: string | null): Uncertain | Fault {
  const { register } = run;
  const { def, id } = quantity;
  const rows = series === null ? 1 : seriesTrials(run, series).length;
  const find = (input: string): Uncertain | Fault => registerValue(run, input, series);
  if (def.origin === 'derived') {
    const result = parsedExpression(register, def.expr);
    const inputs = result.ok ? result.expression.inputs : [];
    return run.node<Uncertain | Fault>(
      `derived:${id}@${series ?? ''}`,
      () => [def.expr, registerNames(run), ...inputs.map(find)],
      () =>
        equationValue(
          register,
          compileEquation(register, { defines: id, text: def.expr, at: id }),
          id,
          rows,
          find,
        ),
    );
  }
  const leaves = def.origin === 'predicted' ? equationLeaves(run, def.model, id) : [];
  const model = def.origin === 'predicted' ? register.models.get(def.model) : undefined;
  return run.node<Uncertain | Fault>(
    `predicted:${id}@${series ?? ''}`,
    () => [quantity, model, registerNames(run), ...leaves.map(find)],
    () => createScope(register, rows, (input) => (input === id ? null : find(input))).find(id, null),
  );
}

/** Register quantities that a model's equation rests on. */
function equationLeaves(run: Evaluation, model: string, quantity: string): readonly string[] {
  const leaves = new Set<string>();
  const seen = new Set<string>();
  const open: Dependent[] = [{ kind: 'equation', model, quantity }];
  for (let next = open.pop(); next !== undefined; next = open.pop()) {
    const name = dependentName(next);
    if (seen.has(name)) continue;
    seen.add(name);
    if (next.kind === 'equation') open.push(...directDependencies(run.register, next));
    else if (next.kind === 'quantity') leaves.add(next.id);
  }
  return [...leaves];
}
