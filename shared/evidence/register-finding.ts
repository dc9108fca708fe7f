import { directDependencies, type Dependent, dependentName } from './dependencies.ts';
import type { Evaluation } from './evaluation.ts';
import type { Quantity } from './evidence.ts';
import { fault, isFault } from './fault.ts';
import type { Fault, Finding, MadeOf } from './findings.ts';
import { madeOfExpression } from './input-refs.ts';
import { columnOf, registerValue, solvedValue, variationOf } from './register-value.ts';
import { symbolName, trialName } from './register.ts';
import { seriesColumns, trialIds } from './series-trials.ts';
import { toColumn, toScalar } from './to-finding.ts';
import { rowOf, type Uncertain } from './uncertain.ts';
import type { Values } from './values.ts';
import { counted, listInWords } from './words.ts';

/** A register value as a finding, inside a series or outside of all. The same object while nothing it shows changed. */
export function registerFinding(run: Evaluation, values: Values, id: string, series: string | null): Finding {
  const quantity = run.register.quantities.get(id);
  if (quantity === undefined) return fault('source gone', 'The quantity is gone. Choose another.', id);
  const place = variationOf(run, id).differsBySeries ? series : null;
  const value = registerValue(run, id, place);
  if (isFault(value)) return value;
  const { quantities, models } = run.evidence;
  const ids = place === null ? null : trialIds(run, place);
  return run.node<Finding>(
    `finding:${id}@${place ?? ''}`,
    () => [value, quantities, models, ids],
    () => {
      if (place !== null && ids !== null && isColumn(run, id, place))
        return columnFinding(run, quantity, place, value);
      return scalarFinding(run, values, quantity, place, value);
    },
  );
}

function columnFinding(run: Evaluation, quantity: Quantity, series: string, value: Uncertain): Finding {
  const ids = trialIds(run, series);
  const entered = quantity.def.origin === 'recorded' || quantity.def.origin === 'constant';
  const faults = entered ? unreadable(run, quantity, series) : notFinite(run, quantity, series, value);
  const [first] = faults;
  if (first !== undefined && value.values.every(Number.isNaN)) return first;
  return toColumn(
    value,
    ids,
    quantity.unit,
    faults.map(({ sentence }) => sentence),
  );
}

function unreadable(run: Evaluation, quantity: Quantity, series: string): readonly Fault[] {
  const column = columnOf(run, quantity, series);
  return isFault(column) ? [] : [...column.faults.values()];
}

/** Trials whose inputs are there, but whose result is not a finite number. */
function notFinite(run: Evaluation, quantity: Quantity, series: string, value: Uncertain): readonly Fault[] {
  const ids = trialIds(run, series);
  const inputs = columnInputs(run, quantity.id, series);
  const bad = ids.filter(
    (_, row) =>
      !Number.isFinite(rowOf(value.values, row)) &&
      inputs.every((input) => Number.isFinite(rowOf(input.values, row))),
  );
  if (bad.length === 0) return [];
  const names =
    bad.length > 5 ? counted(bad.length, 'trial') : listInWords(bad.map((id) => trialName(run.register, id)));
  const sentence = `${symbolName(run.register, quantity.id)} of ${names} does not come out as a finite number. Look for a division by zero or the root or logarithm of a negative number.`;
  return [fault('not finite', sentence, quantity.id)];
}

function columnInputs(run: Evaluation, id: string, series: string): readonly Uncertain[] {
  const inputs: Uncertain[] = [];
  for (const leaf of leavesOf(run, id)) {
    const value = registerValue(run, leaf, series);
    if (!isFault(value)) inputs.push(value);
  }
  return inputs;
}

/** Whether a quantity has one value for each trial of a series. */
export function isColumn(run: Evaluation, id: string, series: string): boolean {
  const columns = seriesColumns(run, series);
  return leavesOf(run, id).some((leaf) => columns.has(leaf) && isEntered(run, leaf));
}

function isEntered(run: Evaluation, id: string): boolean {
  const origin = run.register.quantities.get(id)?.def.origin;
  return origin === 'recorded' || origin === 'constant';
}

/** Entered, fitted and summary quantities that a quantity is computed from; itself where it is one of these. */
function leavesOf(run: Evaluation, id: string): readonly string[] {
  const { quantities, models } = run.evidence;
  return run.node<readonly string[]>(
    `leaves:${id}`,
    () => [quantities, models],
    () => {
      const leaves = new Set<string>();
      const seen = new Set<string>();
      const open: Dependent[] = [{ kind: 'quantity', id }];
      for (let next = open.pop(); next !== undefined; next = open.pop()) {
        const name = dependentName(next);
        if (seen.has(name)) continue;
        seen.add(name);
        const origin =
          next.kind === 'quantity' ? run.register.quantities.get(next.id)?.def.origin : undefined;
        if (next.kind === 'equation' || origin === 'derived' || origin === 'predicted')
          open.push(...directDependencies(run.register, next));
        else if (next.kind === 'quantity') leaves.add(next.id);
      }
      return [...leaves];
    },
  );
}

function scalarFinding(
  run: Evaluation,
  values: Values,
  quantity: Quantity,
  series: string | null,
  value: Uncertain,
): Finding {
  const solved =
    quantity.def.origin === 'fitted' || quantity.def.origin === 'summary' ? solvedValue(run, quantity) : null;
  const known = solved === null || isFault(solved) ? null : solved;
  return toScalar(value, {
    unit: quantity.unit,
    madeOf: known?.madeOf ?? madeOf(values, quantity, series),
    warnings: [...(known?.warnings ?? []), ...uncountedWarnings(run, quantity, series)],
    freedomOf: (source) => values.freedomOf(source),
  });
}

function madeOf(values: Values, quantity: Quantity, series: string | null): MadeOf {
  const { def, id } = quantity;
  if (def.origin === 'derived') return madeOfExpression(values, def.expr, { model: null, series, at: null });
  if (def.origin !== 'predicted') return { kind: 'entered' };
  const equation = values.register.models.get(def.model)?.equations.find(({ defines }) => defines === id);
  return madeOfExpression(values, equation?.expr ?? '', { model: def.model, series, at: null });
}

/** Inputs whose uncertainty is not known although they were measured or assumed: it is missing in the result. */
function uncountedWarnings(run: Evaluation, quantity: Quantity, series: string | null): readonly string[] {
  const { def } = quantity;
  if (def.origin !== 'derived' && def.origin !== 'predicted') return [];
  const uncounted = leavesOf(run, quantity.id).filter((leaf) => {
    const row = run.register.quantities.get(leaf);
    const value = registerValue(run, leaf, series);
    return row?.def.origin === 'constant' && row.status !== 'published' && !isFault(value) && !value.known;
  });
  return uncounted.map(
    (leaf) => `The uncertainty of ${symbolName(run.register, leaf)} is not known and not counted.`,
  );
}
