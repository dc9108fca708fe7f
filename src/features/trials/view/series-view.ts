import type {
  Comparison,
  Evidence,
  Model,
  Quantity,
  Reading,
  Series,
  Trial,
} from '#shared/evidence/evidence.ts';
import { findValue } from '#shared/evidence/find-value.ts';
import type { ComparisonPoint, Findings, Group, Scalar } from '#shared/evidence/findings.ts';
import { readSi } from '#shared/units/reading.ts';

/** One trial as a row: its name and the reading that is drawn, in SI. */
export interface TrialLine {
  readonly trial: Trial;
  /** "B12" */
  readonly name: string;
  /** The drawn reading and its own uncertainty at k = 1; null where it was not read or cannot be understood. */
  readonly value: number | null;
  readonly u: number | null;
}

/** Trials with equal settings, with what is said once for all of them. */
export interface GroupLines {
  readonly key: string;
  readonly settings: Readonly<Record<string, Reading>>;
  readonly lines: readonly TrialLine[];
  readonly mean: Scalar | null;
  readonly predicted: Scalar | null;
  readonly z: number | null;
  /** Trials of another series that are compared together with this one. */
  readonly isBorrowed: boolean;
}

export interface SeriesView {
  readonly series: Series;
  readonly settings: readonly Quantity[];
  readonly readings: readonly Quantity[];
  /** The reading that is drawn in the rows: what the model is about, else the first. */
  readonly drawn: Quantity | null;
  readonly model: Model | null;
  readonly groups: readonly GroupLines[];
  readonly total: number;
  readonly excluded: number;
}

/** All that the Trials screen shows of one series. */
export function seriesView(series: Series, evidence: Evidence, findings: Findings): SeriesView {
  const byId = new Map(evidence.quantities.map((quantity) => [quantity.id, quantity]));
  const pick = (ids: readonly string[]) => ids.flatMap((id) => byId.get(id) ?? []);
  const readings = pick(series.readings);
  const model = latestModelFor(series, evidence);
  const drawn = readings.find(({ id }) => id === model?.output) ?? readings[0] ?? null;
  const letters = new Map(evidence.series.map(({ id, letter }) => [id, letter]));
  const trials = evidence.trials.filter((trial) => !trial.withdrawn);
  const context: LineContext = {
    evidence,
    findings,
    drawn,
    model,
    trials: new Map(trials.map((trial) => [trial.id, trial])),
    nameOf: (trial) => `${letters.get(trial.series) ?? ''}${trial.number}`,
    ownU: ownUncertainty(series, drawn, evidence, findings),
  };
  const comparison = model ? widestComparison(series, model, evidence, findings) : null;
  const points = comparison ? (findings.comparisons.get(comparison.id)?.points ?? []) : [];
  const own = (findings.groups.get(series.id) ?? []).map((group) => ownGroup(group, points, context));
  const borrowed = points
    .filter((point) => point.trials.every((id) => context.trials.get(id)?.series !== series.id))
    .map((point) => borrowedGroup(point, context));
  const mine = trials.filter((trial) => trial.series === series.id);
  return {
    series,
    settings: pick(series.settings),
    readings,
    drawn,
    model,
    groups: inOrder([...borrowed, ...own], pick(series.settings)),
    total: mine.length,
    excluded: mine.filter((trial) => trial.excluded).length,
  };
}

interface LineContext {
  readonly evidence: Evidence;
  readonly findings: Findings;
  readonly drawn: Quantity | null;
  readonly model: Model | null;
  readonly trials: ReadonlyMap<string, Trial>;
  readonly nameOf: (trial: Trial) => string;
  readonly ownU: ReadonlyMap<string, number>;
}

/** Models are numbered as they were stated; the newest one about a reading of the series counts. */
function latestModelFor(series: Series, evidence: Evidence): Model | null {
  return (
    evidence.models.filter(({ output }) => series.readings.includes(output)).sort((a, b) => b.n - a.n)[0] ??
    null
  );
}

/** Of the comparisons of this model with this series, the one that covers most settings. */
function widestComparison(
  series: Series,
  model: Model,
  evidence: Evidence,
  findings: Findings,
): Comparison | null {
  const reach = ({ id }: Comparison) => findings.comparisons.get(id)?.points.length ?? 0;
  return (
    evidence.comparisons
      .filter(
        (comparison) => comparison.model === model.id && comparison.selection.series.includes(series.id),
      )
      .sort((a, b) => reach(b) - reach(a))[0] ?? null
  );
}

/** The instrument's own part for each trial's drawn reading, in SI; a reading's own u comes before it. */
function ownUncertainty(
  series: Series,
  drawn: Quantity | null,
  evidence: Evidence,
  findings: Findings,
): ReadonlyMap<string, number> {
  const column = drawn ? findings.values.get(`${drawn.id}@${series.id}`) : undefined;
  if (column?.shape !== 'column') return new Map();
  return new Map(column.trials.map((id, index) => [id, column.own[index] ?? 0]));
}

function ownGroup(group: Group, points: readonly ComparisonPoint[], context: LineContext): GroupLines {
  const ids = [...group.kept, ...group.excluded];
  const point = points.find(({ trials }) => trials.some((id) => group.kept.includes(id)));
  return {
    key: group.key,
    settings: group.settings,
    lines: linesOf(ids, context),
    mean: meanOf(group, context),
    predicted: point?.predicted ?? predictionOf(group, context),
    z: point?.z ?? null,
    isBorrowed: false,
  };
}

function borrowedGroup(point: ComparisonPoint, context: LineContext): GroupLines {
  return {
    key: `borrowed ${point.trials.join(' ')}`,
    settings: point.settings,
    lines: linesOf(point.trials, context),
    mean: point.measured,
    predicted: point.predicted,
    z: point.z,
    isBorrowed: true,
  };
}

function linesOf(ids: readonly string[], { trials, drawn, nameOf, ownU }: LineContext): TrialLine[] {
  return ids
    .flatMap((id) => trials.get(id) ?? [])
    .sort((a, b) => a.order - b.order)
    .map((trial) => {
      const reading = drawn ? trial.values[drawn.id] : undefined;
      const si = reading ? readSi(reading) : null;
      if (!si?.ok) return { trial, name: nameOf(trial), value: null, u: null };
      return { trial, name: nameOf(trial), value: si.value, u: si.u ?? ownU.get(trial.id) ?? null };
    });
}

function meanOf(group: Group, { drawn, evidence, findings }: LineContext): Scalar | null {
  if (!drawn || group.kept.length === 0) return null;
  const found = findValue(findings, evidence, {
    kind: 'mean',
    quantity: drawn.id,
    series: group.series,
    at: group.settings,
  });
  return found.shape === 'scalar' ? found : null;
}

function predictionOf(group: Group, { drawn, model, evidence, findings }: LineContext): Scalar | null {
  if (!drawn || model?.output !== drawn.id) return null;
  const found = findValue(findings, evidence, {
    kind: 'prediction',
    model: model.id,
    quantity: drawn.id,
    series: group.series,
    at: group.settings,
  });
  return found.shape === 'scalar' ? found : null;
}

/** By the settings, first setting first, smallest first; a setting that cannot be read stands last. */
function inOrder(groups: readonly GroupLines[], settings: readonly Quantity[]): GroupLines[] {
  const at = (group: GroupLines, quantity: Quantity) => {
    const reading = group.settings[quantity.id];
    const si = reading ? readSi(reading) : null;
    return si?.ok ? si.value : Infinity;
  };
  return [...groups].sort((a, b) => {
    for (const quantity of settings) {
      const [left, right] = [at(a, quantity), at(b, quantity)];
      if (left !== right) return left < right ? -1 : 1;
    }
    return Number(b.isBorrowed) - Number(a.isBorrowed);
  });
}
