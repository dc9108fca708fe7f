import { chartCurve } from './chart-curve.ts';
import type { ComparisonData } from './comparison-data.ts';
import { agreement, worstMiss } from './comparison-sentence.ts';
import {
  foundParameters,
  solvedComparison,
  type SolvedComparison,
  type UnsolvedComparison,
} from './comparisons.ts';
import type { Evaluation } from './evaluation.ts';
import type { Chart } from './evidence.ts';
import { fault, isFault } from './fault.ts';
import type { ChartFinding, ComparisonFinding, Fault, Group } from './findings.ts';
import { registerValue } from './register-value.ts';
import { symbolName } from './register.ts';
import { seriesTrials } from './series-trials.ts';
import { rowOf } from './uncertain.ts';
import type { Values } from './values.ts';

/** A comparison as a chart shows it; the same object while nothing it rests on has changed. */
export function chartFinding(
  run: Evaluation,
  values: Values,
  chart: Chart,
  comparisons: ReadonlyMap<string, ComparisonFinding>,
): ChartFinding {
  const comparison = run.register.comparisons.get(chart.comparison);
  const finding = comparisons.get(chart.comparison);
  if (comparison === undefined || finding === undefined)
    return faulty(
      chart,
      fault('source gone', 'The comparison of this chart is gone. Choose another.', chart.id),
    );
  const solved = solvedComparison(run, comparison);
  return run.node<ChartFinding>(
    `chart:${chart.id}`,
    () => [
      chart,
      finding,
      run.evidence.quantities,
      run.evidence.settings,
      ...finding.outside.map(({ trial }) => run.register.trials.get(trial)),
    ],
    () => drawn({ run, values, chart, finding }, solved),
  );
}

interface ChartRequest {
  readonly run: Evaluation;
  readonly values: Values;
  readonly chart: Chart;
  readonly finding: ComparisonFinding;
}

/** The chart of a comparison; one that could not be solved still shows what was measured. */
function drawn(request: ChartRequest, solved: SolvedComparison | UnsolvedComparison): ChartFinding {
  const { run, values, chart, finding } = request;
  const { data } = solved;
  const cause = 'fault' in solved ? solved.fault : axisFault(request);
  if (data === null) return faulty(chart, cause ?? fault('no trials', finding.sentence, chart.id));
  const measured = measuredSide(request, data);
  if (cause !== null) return { ...faulty(chart, cause), ...measured };
  const group = referenceGroup(values, data, finding);
  const parameters = foundParameters('fault' in solved ? null : solved.fit);
  const curve =
    group === null
      ? null
      : chartCurve({ values, x: chart.x, data, parameters, group, points: finding.points });
  if (curve !== null && 'shape' in curve) return { ...faulty(chart, curve), ...measured };
  return { id: chart.id, x: chart.x, ...measured, curve, sentence: sentenceOf(run, chart, finding) };
}

function faulty({ id, x }: Chart, because: Fault): ChartFinding {
  return { id, fault: because, x, y: '', curve: null, points: [], excluded: [], sentence: because.sentence };
}

function measuredSide(
  { run, chart, finding }: ChartRequest,
  data: ComparisonData,
): Pick<ChartFinding, 'y' | 'points' | 'excluded'> {
  return {
    y: data.model.output,
    points: finding.points,
    excluded: excludedPoints(run, chart, data, finding),
  };
}

function axisFault({ run, chart, finding }: ChartRequest): Fault | null {
  if (!run.register.quantities.has(chart.x))
    return fault(
      'source gone',
      'The horizontal axis of this chart is a quantity that is gone. Choose another.',
      chart.id,
    );
  if (finding.points.some((point) => Number.isFinite(point.at[chart.x]))) return null;
  return fault(
    'missing input',
    `${symbolName(run.register, chart.x)} has no value at the compared settings, so that it cannot be the axis. Choose another.`,
    chart.id,
  );
}

/** The group whose other settings the curve is drawn at: the first of the series with the most points. */
function referenceGroup(values: Values, data: ComparisonData, { points }: ComparisonFinding): Group | null {
  const counts = new Map<string, number>();
  for (const { trials } of points) {
    const series = values.register.trials.get(trials[0] ?? '')?.series ?? '';
    counts.set(series, (counts.get(series) ?? 0) + 1);
  }
  const [series] = [...counts].sort((a, b) => b[1] - a[1])[0] ?? [data.comparison.selection.series[0] ?? ''];
  const ids = new Set(points.flatMap(({ trials }) => trials));
  return values.groups(series).find(({ kept }) => kept.some((id) => ids.has(id))) ?? null;
}

function excludedPoints(
  run: Evaluation,
  { x }: Chart,
  data: ComparisonData,
  finding: ComparisonFinding,
): ChartFinding['excluded'] {
  const excluded: { trial: string; x: number; y: number }[] = [];
  for (const { trial, why } of finding.outside) {
    const series = run.register.trials.get(trial)?.series;
    if (why !== 'excluded' || series === undefined) continue;
    const row = seriesTrials(run, series).findIndex(({ id }) => id === trial);
    const [left, up] = [registerValue(run, x, series), registerValue(run, data.model.output, series)];
    if (row < 0 || isFault(left) || isFault(up)) continue;
    const point = { trial, x: rowOf(left.values, row), y: rowOf(up.values, row) };
    if (Number.isFinite(point.x) && Number.isFinite(point.y)) excluded.push(point);
  }
  return excluded;
}

function sentenceOf(run: Evaluation, { x, sentence }: Chart, finding: ComparisonFinding): string {
  if (sentence !== '') return sentence;
  const judged = finding.points.filter(({ trusted, z }) => trusted && z !== null);
  if (judged.length === 0 || (finding.status === 'fitted' && judged.every(({ z }) => z === null)))
    return finding.sentence;
  const values = new Set(judged.map((point) => point.at[x])).size;
  const noun = values === judged.length ? `value` : 'setting';
  const text = agreement(run.register, judged, noun);
  const told = noun === 'value' ? text.replace(/ agree/u, ` of ${symbolName(run.register, x)} agree`) : text;
  return `${told} ${worstMiss(run.register, judged)}`;
}
