import type { Chart } from 'chart.js';
import type { Evidence, ValueReference } from '#shared/evidence/evidence.ts';
import type { ChartFinding } from '#shared/evidence/findings.ts';
import { settingWords } from '#shared/report/setting-words.ts';
import { showValue } from '#shared/report/live-value.ts';
import type { Findings } from '#shared/evidence/findings.ts';

/** A point of a drawn chart that can be asked where it comes from. */
export interface ChartPoint {
  readonly key: string;
  readonly x: number;
  readonly y: number;
  readonly reference: ValueReference;
  /** "At 38°, 46.4 plus or minus 0.4 centimetres, measured, 3 trials, 2.3 u below the prediction". */
  readonly spoken: string;
}

/** Points of a drawn chart from left to right, the measured and the excluded. */
export function chartPoints(
  chart: Chart,
  finding: ChartFinding,
  evidence: Evidence,
  findings: Findings,
): readonly ChartPoint[] {
  const points: ChartPoint[] = [];
  chart.data.datasets.forEach((dataset, i) => {
    const { label = '' } = dataset;
    if (!label.startsWith('measured') && label !== 'excluded') return;
    chart.getDatasetMeta(i).data.forEach((element, j) => {
      const datum: unknown = dataset.data[j];
      const about =
        label === 'excluded'
          ? aboutExcluded(datum, finding, evidence, findings)
          : aboutPoint(datum, finding, evidence, findings);
      if (about) points.push({ ...about, x: element.x, y: element.y });
    });
  });
  return points.sort((a, b) => a.x - b.x);
}

type About = Pick<ChartPoint, 'key' | 'reference' | 'spoken'>;

function aboutPoint(
  datum: unknown,
  finding: ChartFinding,
  evidence: Evidence,
  findings: Findings,
): About | null {
  const index = (datum as { point?: number } | undefined)?.point;
  const point = index === undefined ? undefined : finding.points[index];
  const trial = evidence.trials.find(({ id }) => id === point?.trials[0]);
  const series = evidence.series.find(({ id }) => id === trial?.series);
  if (!point || !series) return null;
  const at = Object.fromEntries(
    Object.entries(point.settings).filter(([id]) => series.settings.includes(id)),
  );
  const reference: ValueReference = { kind: 'mean', quantity: finding.y, series: series.id, at };
  const shown = showValue(reference, 'value', null, evidence, findings);
  return {
    key: `${series.id}:${index}`,
    reference,
    spoken: `At ${settingWords(at, evidence)}, ${shown.spoken}${deviationWords(point.z)}`,
  };
}

function deviationWords(z: number | null): string {
  if (z === null) return '';
  return `, ${Math.abs(z).toFixed(1)} u ${z < 0 ? 'below' : 'above'} the prediction`;
}

function aboutExcluded(
  datum: unknown,
  finding: ChartFinding,
  evidence: Evidence,
  findings: Findings,
): About | null {
  const id = (datum as { trial?: string } | undefined)?.trial;
  const trial = evidence.trials.find((row) => row.id === id);
  if (!trial) return null;
  const reference: ValueReference = { kind: 'reading', trial: trial.id, quantity: finding.y };
  const shown = showValue(reference, 'value', null, evidence, findings);
  const letter = evidence.series.find((row) => row.id === trial.series)?.letter ?? '';
  return { key: trial.id, reference, spoken: `${letter}${trial.number}, excluded, ${shown.spoken}` };
}
