import { sameItems, type Evaluation } from './evaluation.ts';
import type { Reading, Trial } from './evidence.ts';
import { isFault } from './fault.ts';
import type { Group } from './findings.ts';
import { settingsKey } from './keys.ts';
import { registerValue } from './register-value.ts';
import { seriesTrials } from './series-trials.ts';
import { rowOf } from './uncertain.ts';

/** A group and its place in the series. */
export interface GroupRows {
  readonly group: Group;
  /** Rows of the series' columns, kept trials only. */
  readonly rows: readonly number[];
}

/** Trials of a series with equal settings, in increasing order of the settings; unchanged groups stay the same objects. */
export function seriesGroups(run: Evaluation, series: string): readonly GroupRows[] {
  const row = run.register.series.get(series);
  const settings = row?.settings ?? [];
  const trials = seriesTrials(run, series);
  const columns = settings.map((id) => registerValue(run, id, series));
  return run.node<readonly GroupRows[]>(
    `groups@${series}`,
    () => [row, trials, ...columns],
    (earlier) => {
      const before = new Map(earlier?.value.map((group) => [group.group.key, group]));
      const made = collect(series, settings, trials).map(({ key, readings, rows }) => {
        const first = rows[0] ?? 0;
        const values = columns.map((column) => (isFault(column) ? NaN : rowOf(column.values, first)));
        const made = groupOf({ series, key, readings, rows, trials, settings, values });
        const known = before.get(made.group.key);
        return known !== undefined && sameGroup(known, made) ? known : made;
      });
      made.sort((a, b) => compareSettings(settings, a.group, b.group));
      return earlier !== undefined && sameItems(earlier.value, made) ? earlier.value : made;
    },
  );
}

interface Collected {
  readonly key: string;
  readonly readings: Record<string, Reading>;
  readonly rows: number[];
}

function collect(
  series: string,
  settings: readonly string[],
  trials: readonly Trial[],
): readonly Collected[] {
  const groups = new Map<string, Collected>();
  const keys = new Map<string, string>();
  trials.forEach((trial, row) => {
    const typed = settings.map((id) => typedText(trial.values[id])).join('|');
    let key = keys.get(typed);
    if (key === undefined) {
      key = `${series}${settingsKey(settingsOf(settings, trial))}`;
      keys.set(typed, key);
    }
    const group = groups.get(key);
    if (group === undefined) groups.set(key, { key, readings: settingsOf(settings, trial), rows: [row] });
    else group.rows.push(row);
  });
  return [...groups.values()];
}

function typedText(reading: Reading | undefined): string {
  return reading === undefined ? '' : `${reading.text} ${reading.unit}`;
}

/** What a trial was set to; its own u, which may differ from trial to trial, left out. */
function settingsOf(settings: readonly string[], trial: Trial): Record<string, Reading> {
  const readings: Record<string, Reading> = {};
  for (const id of settings) {
    const reading = trial.values[id];
    if (reading !== undefined) readings[id] = { text: reading.text, unit: reading.unit };
  }
  return readings;
}

interface GroupParts extends Collected {
  readonly series: string;
  readonly trials: readonly Trial[];
  readonly settings: readonly string[];
  readonly values: readonly number[];
}

function groupOf({ series, key, readings, rows, trials, settings, values }: GroupParts): GroupRows {
  const kept: number[] = [];
  const [keptIds, excludedIds]: [string[], string[]] = [[], []];
  for (const row of rows) {
    const trial = trials[row];
    if (trial === undefined) continue;
    if (trial.excluded === undefined) {
      kept.push(row);
      keptIds.push(trial.id);
    } else excludedIds.push(trial.id);
  }
  const valuesAt: Record<string, number> = {};
  settings.forEach((id, i) => {
    if (readings[id] !== undefined) valuesAt[id] = values[i] ?? NaN;
  });
  const group: Group = {
    key,
    series,
    settings: readings,
    at: valuesAt,
    kept: keptIds,
    excluded: excludedIds,
  };
  return { group, rows: kept };
}

function sameGroup(a: GroupRows, b: GroupRows): boolean {
  return (
    sameTexts(a.group.kept, b.group.kept) &&
    sameTexts(a.group.excluded, b.group.excluded) &&
    a.rows.length === b.rows.length &&
    a.rows.every((row, i) => row === b.rows[i]) &&
    JSON.stringify(a.group.settings) === JSON.stringify(b.group.settings) &&
    Object.keys(b.group.at).every((id) => Object.is(a.group.at[id], b.group.at[id]))
  );
}

function sameTexts(a: readonly string[], b: readonly string[]): boolean {
  return a.length === b.length && a.every((text, i) => text === b[i]);
}

/** Increasing in the first setting that differs; a group without a value for it comes last. */
export function compareSettings(
  settings: readonly string[],
  a: Pick<Group, 'at'>,
  b: Pick<Group, 'at'>,
): number {
  for (const id of settings) {
    const [left, right] = [a.at[id] ?? Infinity, b.at[id] ?? Infinity];
    if (left !== right) return left < right || Number.isNaN(right) ? -1 : 1;
  }
  return 0;
}
