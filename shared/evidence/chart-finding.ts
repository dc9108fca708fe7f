import { agreement, worstMiss } from './comparison-sentence.ts';
import { foundParameters, solvedComparison } from './comparisons.ts';
import type { ComparisonData } from './comparison-data.ts';
import { dependsOn } from './dependencies.ts';
import type { Evaluation } from './evaluation.ts';
import type { Chart } from './evidence.ts';
import { fault, isFault } from './fault.ts';
import type { ChartFinding, ComparisonFinding, Fault, Group } from './findings.ts';
import { knownAtPlace, placeOfGroup } from './place.ts';
import { registerValue } from './register-value.ts';
import { symbolName } from './register.ts';
import { createScope } from './scope.ts';
import { inRange } from './selected-trials.ts';
import { seriesTrials } from './series-trials.ts';
import { rootSumOfSquares, rowOf, type Uncertain } from './uncertain.ts';
import type { Values } from './values.ts';

/** Points of a curve: enough for a line that looks smooth at the width of a page. */
const CURVE_POINTS = 241;

/** Air beside the outermost points, as a share of their distance. */
const AIR = 0.04;

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
    () => {
      if (!run.register.quantities.has(chart.x))
        return faulty(
          chart,
          fault(
            'source gone',
            'The horizontal axis of this chart is a quantity that is gone. Choose another.',
            chart.id,
          ),
        );
      if (solved.data === null || 'fault' in solved)
        return faulty(
          chart,
          'fault' in solved ? solved.fault : fault('no trials', finding.sentence, comparison.id),
        );
      const group = referenceGroup(values, solved.data, finding);
      const curve =
        group === null
          ? null
          : curveOf(values, chart, {
              data: solved.data,
              parameters: foundParameters(solved.fit),
              group,
              finding,
            });
      if (curve !== null && isFault(curve)) return faulty(chart, curve, solved.data.model.output);
      return {
        id: chart.id,
        x: chart.x,
        y: solved.data.model.output,
        curve,
        points: finding.points,
        excluded: excludedPoints(run, chart, solved.data, finding),
        sentence: sentenceOf(run, chart, finding),
      };
    },
  );
}

function faulty({ id, x }: Chart, because: Fault, y = ''): ChartFinding {
  return { id, fault: because, x, y, curve: null, points: [], excluded: [], sentence: because.sentence };
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

interface CurveRequest {
  readonly data: ComparisonData;
  readonly parameters: ReadonlyMap<string, Uncertain>;
  readonly group: Group;
  readonly finding: ComparisonFinding;
}

/** The predicted curve: the model over the axis, with the x's own uncertainty as it is at the reference group. */
function curveOf(
  values: Values,
  { x }: Chart,
  { data, parameters, group, finding }: CurveRequest,
): ChartFinding['curve'] | Fault {
  const xs = finding.points.map((point) => point.at[x] ?? NaN).filter(Number.isFinite);
  if (xs.length === 0)
    return fault(
      'missing input',
      `${symbolName(values.register, x)} has no value at the compared settings, so that it cannot be the axis.`,
      x,
    );
  const axis = axisOf(Math.min(...xs), Math.max(...xs));
  const known = knownAtPlace(values, placeOfGroup(values, group));
  const own = known(x);
  const along: Uncertain = {
    values: axis,
    terms: own === null || isFault(own) ? [] : own.terms,
    known: true,
    hue: 'measured',
  };
  const free = new Set(parameters.keys());
  const moving = new Set([x]);
  const scope = createScope(values.register, axis.length, (id) => {
    if (id === x) return along;
    const parameter = parameters.get(id);
    if (parameter !== undefined) return parameter;
    return dependsOn(values.register, id, free) || dependsOn(values.register, id, moving) ? null : known(id);
  });
  const y = scope.find(data.model.output, data.model.id);
  if (isFault(y)) return y;
  const trusted = new Uint8Array(axis.length).fill(1);
  for (const limit of data.limits) {
    const value = scope.find(limit.quantity, data.model.id);
    for (let i = 0; i < axis.length; i++)
      if (isFault(value) || !inRange(rowOf(value.values, i), limit)) trusted[i] = 0;
  }
  const n = axis.length;
  return {
    x: axis,
    y: Float64Array.from(axis, (_, i) => rowOf(y.values, i)),
    u: rootSumOfSquares(y.terms, n) ?? new Float64Array(n),
    trusted,
  };
}

function axisOf(low: number, high: number): Float64Array {
  const air = high > low ? AIR * (high - low) : 0.1 * Math.abs(low) || 1;
  const [from, to] = [low - air, high + air];
  const start = low >= 0 && from < 0 ? 0 : from;
  return Float64Array.from(
    { length: CURVE_POINTS },
    (_, i) => start + ((to - start) * i) / (CURVE_POINTS - 1),
  );
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
