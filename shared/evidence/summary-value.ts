import { at, item } from '#shared/numeric/element.ts';
import { pooledStdDev } from '#shared/statistics/pooled-std-dev.ts';
import { sampleStdDev } from '#shared/statistics/sample-std-dev.ts';
import type { Evaluation, Solved } from './evaluation.ts';
import type { Quantity, QuantityDefinition } from './evidence.ts';
import { fault, isFault } from './fault.ts';
import type { Column, Fault, Part } from './findings.ts';
import { seriesGroups } from './groups.ts';
import { meanOfRows } from './mean-of-group.ts';
import { registerNames, registerValue } from './register-value.ts';
import { symbolName } from './register.ts';
import { gather, selectTrials, type Pick } from './selected-trials.ts';
import { keptTrials, trialIds } from './series-trials.ts';
import { slopeOfLine } from './slope-of-line.ts';
import { toColumn } from './to-finding.ts';
import { partsOfRow, uncertainValue } from './uncertain.ts';

type SummaryDefinition = Extract<QuantityDefinition, { origin: 'summary' }>;

/** A statistic of a column over selected trials; the same object while nothing it rests on has changed. */
export function summaryQuantity(run: Evaluation, quantity: Quantity): Solved | Fault {
  const { def } = quantity;
  if (def.origin !== 'summary') return fault('source gone', 'This quantity is no statistic.', quantity.id);
  const needed = [
    def.of,
    ...(def.against === undefined ? [] : [def.against]),
    ...def.where.where.map((range) => range.quantity),
  ];
  const series = [
    ...new Set([
      ...def.where.series,
      ...def.where.plusTrials.map((id) => run.register.trials.get(id)?.series ?? ''),
    ]),
  ];
  return run.node<Solved | Fault>(
    `summary:${quantity.id}`,
    () => [
      quantity,
      registerNames(run),
      ...series.flatMap((id) => [trialIds(run, id), keptTrials(run, id), seriesGroups(run, id)]),
      ...series.flatMap((id) => needed.map((input) => registerValue(run, input, id))),
    ],
    () => summarise(run, quantity, def),
  );
}

function summarise(run: Evaluation, quantity: Quantity, def: SummaryDefinition): Solved | Fault {
  const symbol = symbolName(run.register, quantity.id);
  const of = symbolName(run.register, def.of);
  const selected = selectTrials(run, def.where, quantity.id);
  if (isFault(selected)) return selected;
  const kept = selected.filter(({ series, row }) => keptTrials(run, series)[row] === true);
  const gathered = kept.length === 0 ? null : gather(run, def.of, kept);
  if (gathered !== null && isFault(gathered)) return gathered;
  const whole =
    gathered === null
      ? null
      : toColumn(
          gathered,
          kept.map(({ id }) => id),
          quantity.unit,
          [],
        );
  const rows =
    whole === null ? [] : kept.flatMap((_, row) => (Number.isFinite(at(whole.values, row)) ? [row] : []));
  const trials = rows.map((row) => item(kept, row));
  if (def.stat === 'count') return exactCount(trials);
  if (whole === null || rows.length === 0)
    return fault(
      'no trials',
      `${symbol} has no kept trial with ${of} to be made from. Choose other trials, or log some.`,
      quantity.id,
    );
  return statistic({ run, quantity, def, column: whole, rows, trials, leftOut: leftOutOf(selected, trials) });
}

function leftOutOf(selected: readonly Pick[], used: readonly Pick[]): readonly string[] {
  const kept = new Set(used.map(({ id }) => id));
  return selected.map(({ id }) => id).filter((id) => !kept.has(id));
}

function exactCount(trials: readonly Pick[]): Solved {
  const ids = trials.map(({ id }) => id);
  return {
    uncertain: uncertainValue(ids.length, [], false, 'count'),
    madeOf: { kind: 'count', trials: ids },
    warnings: [],
    degreesOfFreedom: Infinity,
  };
}

interface StatisticRequest {
  readonly run: Evaluation;
  readonly quantity: Quantity;
  readonly def: SummaryDefinition;
  readonly column: Column;
  readonly rows: readonly number[];
  readonly trials: readonly Pick[];
  readonly leftOut: readonly string[];
}

function statistic(request: StatisticRequest): Solved | Fault {
  const { quantity, def, rows, column } = request;
  const values = rows.map((row) => at(column.values, row));
  switch (def.stat) {
    case 'mean':
    case 'median':
      return central(request, values);
    case 'standard deviation':
      return spread(request, values);
    case 'minimum':
    case 'maximum':
      return extreme(request, values);
    case 'slope':
      return slope(request);
    case 'count':
      return fault('source gone', 'A count is made elsewhere.', quantity.id);
  }
}

/** Efficiency of the median of many normal readings: u(median) = √(π/2) u(mean). Source: Kendall, Stuart, The Advanced Theory of Statistics 1, 10.10. */
const MEDIAN_FACTOR = Math.sqrt(Math.PI / 2);

function central(request: StatisticRequest, values: readonly number[]): Solved {
  const { quantity, def, column, rows } = request;
  const source = `mean:${quantity.id}`;
  const pooled = def.scatter === 'pooled' ? pooledScatter(request) : null;
  const mean = meanOfRows(
    { column, rows, leftOut: request.leftOut, source, ...(pooled === null ? {} : { pooled }) },
    () => ({ degreesOfFreedom: Infinity }),
  );
  const factor = def.stat === 'median' ? MEDIAN_FACTOR : 1;
  const parts = mean.parts.map((part) => (part.source === source ? { source, c: part.c * factor } : part));
  return {
    uncertain: uncertainValue(
      def.stat === 'median' ? median(values) : mean.value,
      parts,
      mean.u !== null,
      column.hue,
    ),
    madeOf: def.stat === 'median' ? { kind: 'summary', stat: 'median', trials: idsOf(request) } : mean.madeOf,
    warnings: mean.warnings,
    degreesOfFreedom: pooled?.degreesOfFreedom ?? Math.max(1, rows.length - 1),
  };
}

function median(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  const middle = Math.floor(sorted.length / 2);
  return sorted.length % 2 === 1
    ? item(sorted, middle)
    : (item(sorted, middle - 1) + item(sorted, middle)) / 2;
}

/** Scatter pooled over the groups of equal settings that the trials fall into. */
function pooledScatter({
  run,
  column,
  rows,
  trials,
}: StatisticRequest): { scatter: number; degreesOfFreedom: number } | null {
  const groupOf = new Map<string, string>();
  for (const series of new Set(trials.map((pick) => pick.series)))
    for (const { group } of seriesGroups(run, series))
      for (const id of group.kept) groupOf.set(id, group.key);
  const groups = new Map<string, number[]>();
  rows.forEach((row, i) => {
    const key = groupOf.get(item(trials, i).id) ?? '';
    groups.set(key, [...(groups.get(key) ?? []), at(column.values, row)]);
  });
  const pooled = pooledStdDev([...groups.values()]);
  return pooled === null ? null : { scatter: pooled.value, degreesOfFreedom: pooled.degreesOfFreedom };
}

function spread(request: StatisticRequest, values: readonly number[]): Solved | Fault {
  const n = values.length;
  const scatter = sampleStdDev(values);
  if (scatter === null) return tooFew(request, 2);
  const u = scatter / Math.sqrt(2 * (n - 1));
  const parts: Part[] = u > 0 ? [{ source: `mean:${request.quantity.id}`, c: u }] : [];
  return solvedOf(request, scatter, parts, n - 1);
}

function extreme(request: StatisticRequest, values: readonly number[]): Solved {
  const { def, column, rows, trials } = request;
  const best = def.stat === 'minimum' ? Math.min(...values) : Math.max(...values);
  const index = values.indexOf(best);
  const row = item(rows, index);
  const own = at(column.own, row);
  const parts: Part[] = own > 0 ? [{ source: `trial:${item(trials, index).id}:${def.of}`, c: own }] : [];
  const shared = column.shared.map(({ source, c }) => ({ source, kind: 'shared' as const, c }));
  return solvedOf(request, best, [...parts, ...partsOfRow(shared, row, (source) => source)], Infinity);
}

function slope(request: StatisticRequest): Solved | Fault {
  const { run, def, quantity, column, trials, rows } = request;
  const against = def.against === undefined ? null : gather(run, def.against, trials);
  if (against === null)
    return fault(
      'missing input',
      `${symbolName(run.register, quantity.id)} is a slope. Say against which quantity.`,
      quantity.id,
    );
  if (isFault(against)) return against;
  if (rows.length < 3) return tooFew(request, 3);
  const line = slopeOfLine(against, column, rows);
  if (line === null)
    return fault(
      'constant input',
      `${symbolName(run.register, def.against ?? '')} is the same in all trials, so that there is no slope against it. Choose trials that differ in it.`,
      quantity.id,
    );
  const parts: Part[] =
    line.u > 0 ? [{ source: `mean:${quantity.id}`, c: line.u }, ...line.shared] : [...line.shared];
  return solvedOf(request, line.slope, parts, rows.length - 2);
}

function solvedOf(
  request: StatisticRequest,
  value: number,
  parts: readonly Part[],
  degreesOfFreedom: number,
): Solved {
  return {
    uncertain: uncertainValue(value, parts, parts.length > 0, request.column.hue),
    madeOf: { kind: 'summary', stat: request.def.stat, trials: idsOf(request) },
    warnings: [],
    degreesOfFreedom,
  };
}

function idsOf({ trials }: StatisticRequest): readonly string[] {
  return trials.map(({ id }) => id);
}

function tooFew({ run, quantity, def, rows }: StatisticRequest, needed: number): Fault {
  return fault(
    'too few trials',
    `The ${def.stat} ${symbolName(run.register, quantity.id)} needs at least ${needed} trials, and there ${rows.length === 1 ? 'is 1' : `are ${rows.length}`}.`,
    quantity.id,
  );
}
