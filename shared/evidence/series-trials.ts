import { sameItems, type Evaluation } from './evaluation.ts';
import type { Trial } from './evidence.ts';

const NONE: readonly Trial[] = [];

/** Trials of a series in the order of the evidence, without those taken back. */
export function seriesTrials(run: Evaluation, series: string): readonly Trial[] {
  const bySeries = run.node<ReadonlyMap<string, readonly Trial[]>>(
    'trials',
    () => [run.evidence.trials],
    (earlier) => splitBySeries(run.evidence.trials, earlier?.value),
  );
  return bySeries.get(series) ?? NONE;
}

function splitBySeries(
  trials: readonly Trial[],
  earlier: ReadonlyMap<string, readonly Trial[]> | undefined,
): ReadonlyMap<string, readonly Trial[]> {
  const split = new Map<string, Trial[]>();
  for (const trial of trials) {
    if (trial.withdrawn !== undefined) continue;
    const own = split.get(trial.series);
    if (own === undefined) split.set(trial.series, [trial]);
    else own.push(trial);
  }
  const settled = new Map<string, readonly Trial[]>();
  for (const [series, own] of split) {
    const before = earlier?.get(series);
    settled.set(series, before !== undefined && sameItems(before, own) ? before : own);
  }
  return settled;
}

/** Whether each trial of a series counts (is not excluded); the same array while nothing changed. */
export function keptTrials(run: Evaluation, series: string): readonly boolean[] {
  return run.node<readonly boolean[]>(
    `kept@${series}`,
    () => [seriesTrials(run, series)],
    (earlier) => {
      const kept = seriesTrials(run, series).map(({ excluded }) => excluded === undefined);
      return earlier !== undefined && sameItems(earlier.value, kept) ? earlier.value : kept;
    },
  );
}

/** Quantities that trials of a series carry: its settings and readings, and whatever a trial has besides. */
export function seriesColumns(run: Evaluation, series: string): ReadonlySet<string> {
  const row = run.register.series.get(series);
  return run.node<ReadonlySet<string>>(
    `columns@${series}`,
    () => [row, seriesTrials(run, series)],
    (earlier) => {
      const columns = new Set([...(row?.settings ?? []), ...(row?.readings ?? [])]);
      for (const { values } of seriesTrials(run, series)) for (const id in values) columns.add(id);
      return earlier !== undefined && sameItems([...earlier.value], [...columns]) ? earlier.value : columns;
    },
  );
}

/** Ids of a series' trials, in their order; the same array while none comes or goes. */
export function trialIds(run: Evaluation, series: string): readonly string[] {
  return run.node<readonly string[]>(
    `ids@${series}`,
    () => [seriesTrials(run, series)],
    (earlier) => {
      const ids = seriesTrials(run, series).map(({ id }) => id);
      return earlier !== undefined && sameItems(earlier.value, ids) ? earlier.value : ids;
    },
  );
}
