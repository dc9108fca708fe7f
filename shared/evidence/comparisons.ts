import { checkedReading } from './constant-value.ts';
import { comparisonData, type ComparisonData, type FreeParameter } from './comparison-data.ts';
import { solveComparison, type Goodness, type SolvedFit } from './comparison-fit.ts';
import { comparisonInputs } from './dependencies.ts';
import type { Evaluation, Solved } from './evaluation.ts';
import type { Comparison, Quantity, Reading } from './evidence.ts';
import { fault, isFault, passedOn } from './fault.ts';
import type { ComparisonFinding, Fault } from './findings.ts';
import { predictionGoodness } from './prediction-goodness.ts';
import { cycleOf, registerNames, registerValue } from './register-value.ts';
import { symbolName } from './register.ts';
import { keptTrials, trialIds } from './series-trials.ts';
import { uncertainValue, type Uncertain } from './uncertain.ts';

/** A comparison solved: its trials, and what was found or how well the prediction does. */
export interface SolvedComparison {
  readonly data: ComparisonData;
  /** null: nothing was free. */
  readonly fit: SolvedFit | null;
  readonly goodness: Goodness;
}

/** A comparison that could not be solved; its trials where these at least are known. */
export interface UnsolvedComparison {
  readonly fault: Fault;
  readonly data: ComparisonData | null;
  readonly outside: ComparisonFinding['outside'];
}

/** Solves a comparison; the same object while nothing it rests on has changed. */
export function solvedComparison(
  run: Evaluation,
  comparison: Comparison,
): SolvedComparison | UnsolvedComparison {
  return run.node(
    `solved:${comparison.id}`,
    () => comparisonDeps(run, comparison),
    () => solve(run, comparison),
  );
}

/** Everything that a comparison rests on: its definition, its trials, and the values of its leaves in their series. */
export function comparisonDeps(run: Evaluation, comparison: Comparison): readonly unknown[] {
  const { leaves, texts } = comparisonInputs(run.register, comparison);
  const series = selectedSeries(run, comparison);
  return [
    comparison,
    run.register.models.get(comparison.model),
    registerNames(run),
    texts.join('\n'),
    cycleOf(run, `comparison:${comparison.id}`)?.sentence,
    ...series.flatMap((id) => [id, trialIds(run, id), keptTrials(run, id)]),
    ...series.flatMap((id) =>
      leaves.map((leaf) => (leaf.kind === 'quantity' ? registerValue(run, leaf.id, id) : null)),
    ),
  ];
}

/** Series of a comparison's trials, those of single trials included. */
export function selectedSeries(run: Evaluation, { selection }: Comparison): readonly string[] {
  const series = new Set(selection.series);
  for (const id of selection.plusTrials) {
    const trial = run.register.trials.get(id);
    if (trial !== undefined) series.add(trial.series);
  }
  return [...series];
}

function solve(run: Evaluation, comparison: Comparison): SolvedComparison | UnsolvedComparison {
  const cycle = cycleOf(run, `comparison:${comparison.id}`);
  if (cycle !== null) return { fault: cycle, data: null, outside: [] };
  const free = freeParameters(run, comparison);
  if (isFault(free)) return { fault: free, data: null, outside: [] };
  const data = comparisonData(run, comparison, free);
  if ('fault' in data) return { ...data, data: null };
  if (free.length === 0) return { data, fit: null, goodness: predictionGoodness(run.register, data) };
  const fit = solveComparison(run.register, data);
  return isFault(fit) ? { fault: fit, data, outside: data.outside } : { data, fit, goodness: fit };
}

function freeParameters(run: Evaluation, comparison: Comparison): readonly FreeParameter[] | Fault {
  const free: FreeParameter[] = [];
  for (const parameter of comparison.free) {
    const read = freeParameter(run, comparison, parameter);
    if (isFault(read)) return read;
    free.push(read);
  }
  return free;
}

function freeParameter(
  run: Evaluation,
  { id, name }: Comparison,
  parameter: Comparison['free'][number],
): FreeParameter | Fault {
  const quantity = run.register.quantities.get(parameter.quantity);
  if (quantity === undefined)
    return fault('source gone', `A free parameter of “${name}” is gone. Choose another.`, id);
  const words = (what: string): string =>
    `The ${what} of ${symbolName(run.register, quantity.id)} in “${name}”`;
  const read = (reading: Reading | null, what: string): number | undefined | Fault => {
    if (reading === null) return undefined;
    const checked = checkedReading(run.register, reading, quantity, { words: () => words(what), at: id });
    return 'shape' in checked ? checked : checked.value;
  };
  const start = read(parameter.start, 'start');
  const min = read(parameter.min, 'lower bound');
  const max = read(parameter.max, 'upper bound');
  for (const end of [start, min, max]) if (typeof end === 'object') return end;
  if (typeof start !== 'number' || typeof min === 'object' || typeof max === 'object')
    return fault('missing input', `${words('start')} is missing. Enter one.`, id);
  if (min !== undefined && max !== undefined && min >= max)
    return fault(
      'not a number',
      `${words('lower bound')} is not below the upper one. Exchange them, or leave one out.`,
      id,
    );
  if (start < (min ?? -Infinity) || start > (max ?? Infinity))
    return fault('not a number', `${words('start')} lies outside of its bounds. Start inside.`, id);
  return { quantity: parameter.quantity, start, min, max };
}

/** Values of the free parameters with all their parts, by quantity. */
export function foundParameters(fit: SolvedFit | null): ReadonlyMap<string, Uncertain> {
  const found = new Map<string, Uncertain>();
  for (const { quantity, value, fitParts, sharedParts } of fit?.parameters ?? [])
    found.set(quantity, uncertainValue(value, [...fitParts, ...sharedParts], true, 'predicted'));
  return found;
}

/** The value of a fitted quantity: its parameter in the comparison that it takes its value from. */
export function fittedQuantity(run: Evaluation, quantity: Quantity): Solved | Fault {
  const { def, id } = quantity;
  const comparison = def.origin === 'fitted' ? run.register.comparisons.get(def.comparison) : undefined;
  const symbol = symbolName(run.register, id);
  if (comparison === undefined)
    return fault('source gone', `The comparison that ${symbol} is fitted by is gone. Choose another.`, id);
  const solved = solvedComparison(run, comparison);
  return run.node<Solved | Fault>(
    `fitted:${id}`,
    () => [solved, quantity],
    () => {
      if ('fault' in solved) return passedOn(solved.fault, `The comparison “${comparison.name}”`);
      const uncertain = foundParameters(solved.fit).get(id);
      if (uncertain === undefined)
        return fault(
          'missing input',
          `“${comparison.name}” does not leave ${symbol} free. Free it there, or choose another comparison.`,
          comparison.id,
        );
      return {
        uncertain,
        madeOf: { kind: 'fit', comparison: comparison.id },
        warnings: [],
        degreesOfFreedom: Infinity,
      };
    },
  );
}

/** Degrees of freedom of a comparison's statistical parts: limited only where the weights come from the residuals. */
export function fitFreedom(run: Evaluation, id: string): number {
  const comparison = run.register.comparisons.get(id);
  if (comparison === undefined || comparison.weights === 'absolute') return Infinity;
  const solved = solvedComparison(run, comparison);
  return 'fault' in solved ? Infinity : (solved.goodness.degreesOfFreedom ?? Infinity);
}
