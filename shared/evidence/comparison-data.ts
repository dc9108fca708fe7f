import { at } from '#shared/numeric/element.ts';
import { dependsOn } from './dependencies.ts';
import type { Evaluation } from './evaluation.ts';
import type { Comparison, Model } from './evidence.ts';
import { fault, isFault } from './fault.ts';
import type { ComparisonFinding, Fault } from './findings.ts';
import { symbolName, type Register } from './register.ts';
import { createScope, notDefined } from './scope.ts';
import { gather, inRange, selectTrials, siRange, type Pick, type SiRange } from './selected-trials.ts';
import { keptTrials } from './series-trials.ts';
import { rowOf, type Uncertain } from './uncertain.ts';

/** A parameter as a comparison lets it go. */
export interface FreeParameter {
  readonly quantity: string;
  readonly start: number;
  readonly min: number | undefined;
  readonly max: number | undefined;
}

type Outside = ComparisonFinding['outside'];

/** What a comparison sets against its model: trials, sorted by why they count or not, and their columns. */
export interface ComparisonData {
  readonly comparison: Comparison;
  readonly model: Model;
  readonly free: readonly FreeParameter[];
  readonly limits: readonly SiRange[];
  /** Trials that count, and those that are kept and complete but outside trust. */
  readonly used: readonly Pick[];
  readonly untrusted: readonly Pick[];
  readonly outside: Outside;
  /** Measured side and what the model takes, over the used trials. */
  readonly measured: Uncertain;
  readonly leaves: ReadonlyMap<string, Uncertain>;
}

/** A comparison whose trials cannot be had, with what is known of them. */
export interface FaultyComparison {
  readonly fault: Fault;
  readonly outside: Outside;
}

/** Gathers a comparison's trials and columns. */
export function comparisonData(
  run: Evaluation,
  comparison: Comparison,
  free: readonly FreeParameter[],
): ComparisonData | FaultyComparison {
  const model = run.register.models.get(comparison.model);
  if (model === undefined)
    return faulty(
      fault('source gone', 'The model of this comparison is gone. Choose another.', comparison.id),
    );
  const selected = selectTrials(run, comparison.selection, comparison.id);
  if (isFault(selected)) return faulty(selected);
  const limits = limitsOf(run, model);
  if (isFault(limits)) return faulty(limits);
  const definition = { model, free, limits };
  const isKept = ({ series, row }: Pick): boolean => keptTrials(run, series)[row] === true;
  const kept = selected.filter(isKept);
  const excluded = because(
    selected.filter((pick) => !isKept(pick)),
    'excluded',
  );
  if (kept.length === 0) return faulty(noTrials(comparison, selected.length), excluded);
  const whole = sideColumns(run, definition, kept);
  if (isFault(whole)) return faulty(whole, excluded);
  const incomplete = kept.filter((_, row) => !whole.complete(row));
  const used = kept.filter((_, row) => whole.complete(row) && whole.trusted(row));
  const untrusted = kept.filter((_, row) => whole.complete(row) && !whole.trusted(row));
  const outside = [...excluded, ...because(incomplete, 'incomplete'), ...because(untrusted, 'outside trust')];
  if (used.length === 0) return faulty(noneUsed(comparison, model, kept.length), outside);
  const part = used.length === kept.length ? whole : sideColumns(run, definition, used);
  if (isFault(part)) return faulty(part, outside);
  const { measured, leaves } = part;
  return { comparison, model, free, limits, used, untrusted, outside, measured, leaves };
}

function because(picks: readonly Pick[], why: Outside[number]['why']): Outside {
  return picks.map(({ id }) => ({ trial: id, why }));
}

function limitsOf(run: Evaluation, model: Model): readonly SiRange[] | Fault {
  const limits: SiRange[] = [];
  for (const limit of model.limits) {
    const range = siRange(run, limit, model.id);
    if (isFault(range)) return range;
    limits.push(range);
  }
  return limits;
}

function faulty(cause: Fault, outside: Outside = []): FaultyComparison {
  return { fault: cause, outside };
}

function noTrials(comparison: Comparison, selected: number): Fault {
  const sentence =
    selected === 0
      ? 'No trial is selected. Choose a series that has trials, or widen the range.'
      : 'Every selected trial is excluded. Bring one back, or log another.';
  return fault('no trials', `“${comparison.name}” has nothing to compare. ${sentence}`, comparison.id);
}

function noneUsed(comparison: Comparison, model: Model, kept: number): Fault {
  return fault(
    'no trials',
    `“${comparison.name}” has nothing to compare: ${kept === 1 ? 'its trial is' : `all of its ${kept} trials are`} incomplete or outside the range in which model ${model.n} is trusted.`,
    comparison.id,
  );
}

interface Definition {
  readonly model: Model;
  readonly free: readonly FreeParameter[];
  readonly limits: readonly SiRange[];
}

interface SideColumns {
  readonly measured: Uncertain;
  readonly leaves: ReadonlyMap<string, Uncertain>;
  complete(row: number): boolean;
  trusted(row: number): boolean;
}

/** Both sides' columns over some picks; the model is run once at the start values to see what it takes. */
function sideColumns(run: Evaluation, definition: Definition, picks: readonly Pick[]): SideColumns | Fault {
  const { model, free, limits } = definition;
  const { register } = run;
  const unfit = outputFault(register, model);
  if (unfit !== null) return unfit;
  const measured = gather(run, model.output, picks);
  if (isFault(measured)) return measured;
  const parameters = new Set(free.map(({ quantity }) => quantity));
  const leaves = new Map<string, Uncertain>();
  const scope = createScope(register, picks.length, (id) => {
    const start = free.find(({ quantity }) => quantity === id);
    if (start !== undefined)
      return { values: Float64Array.of(start.start), terms: [], known: false, hue: 'predicted' };
    if (dependsOn(register, id, parameters)) return null;
    const value = gather(run, id, picks);
    if (!isFault(value)) leaves.set(id, value);
    return value;
  });
  const predicted = scope.find(model.output, model.id);
  if (isFault(predicted) && predicted.code !== 'not finite') return predicted;
  const ranges = limits.map((limit) => ({ limit, value: scope.find(limit.quantity, model.id) }));
  const broken = ranges.find(({ value }) => isFault(value));
  if (broken !== undefined && isFault(broken.value)) return broken.value;
  const columns = [measured, ...leaves.values()];
  return {
    measured,
    leaves,
    complete: (row) => columns.every(({ values }) => !Number.isNaN(rowOf(values, row))),
    trusted: (row) =>
      ranges.every(({ limit, value }) => isFault(value) || inRange(rowOf(value.values, row), limit)),
  };
}

/** Why a model's output cannot be set against trials; null when it can. */
function outputFault(register: Register, model: Model): Fault | null {
  const origin = register.quantities.get(model.output)?.def.origin;
  if (origin === 'predicted' || origin === 'fitted')
    return fault(
      'missing input',
      `${symbolName(register, model.output)} is not measured, so that nothing can be set against it. Let the model’s output be a quantity that trials read.`,
      model.id,
    );
  const isDefined = model.equations.some(({ defines }) => defines === model.output);
  return isDefined ? null : notDefined(register, model.output, model.id);
}

/** Whether every value of a column is the same. */
export function isConstant({ values }: Uncertain): boolean {
  return values.every((value) => value === at(values, 0));
}
