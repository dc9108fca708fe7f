import type { Evidence, Reading, Series } from '#shared/evidence/evidence.ts';
import type { Findings } from '#shared/evidence/findings.ts';
import { predictAt } from '#shared/evidence/predict.ts';
import { formatScalar, formatValue } from '#shared/formatting/format-scalar.ts';
import { readSi } from '#shared/units/reading.ts';
import type { SeriesView } from './series-view.ts';

/** What the entry bar says of a trial that is not logged yet. */
export type Deviation =
  | { readonly kind: 'none'; readonly sentence: string }
  | {
      readonly kind: 'predicted';
      /** "47.0 ± 0.6 cm" */
      readonly predicted: string;
      /** "2.3 cm short"; null while no reading is typed. */
      readonly away: string | null;
      /** Farther from the prediction than k times its uncertainty. */
      readonly isBeyond: boolean;
      /** "In line with B14 to B16." */
      readonly line: string | null;
      /** What is said once it is logged. */
      readonly sentence: string;
    };

/** Null where no model of the series predicts the reading. */
export function deviation(
  evidence: Evidence,
  findings: Findings,
  series: Series,
  { drawn, model, groups }: SeriesView,
  values: Readonly<Record<string, Reading>>,
): Deviation | null {
  if (!drawn || !model || model.output !== drawn.id) return null;
  if (series.settings.some((id) => !values[id])) return null;
  const settings = Object.fromEntries(
    series.settings.flatMap((id) => (values[id] ? [[id, values[id]]] : [])),
  );
  const predicted = predictAt(evidence, findings, {
    model: model.id,
    quantity: drawn.id,
    series: series.id,
    values: settings,
  });
  if (predicted.shape === 'fault')
    return { kind: 'none', sentence: `Nothing is predicted here: ${predicted.sentence}` };
  const { rounding, k } = evidence.settings;
  const shown = formatScalar(predicted, drawn.unit, rounding);
  const reading = values[drawn.id];
  const si = reading ? readSi(reading) : null;
  if (!si?.ok) {
    return { kind: 'predicted', predicted: shown, away: null, isBeyond: false, line: null, sentence: '' };
  }
  const gap = si.value - predicted.value;
  const u = Math.hypot(predicted.u ?? 0, si.u ?? 0);
  const size = formatValue({ value: Math.abs(gap), u: u || null }, drawn.unit, rounding);
  const away = `${size} ${gap < 0 ? 'short' : 'over'}`;
  return {
    kind: 'predicted',
    predicted: shown,
    away,
    isBeyond: u > 0 && Math.abs(gap) > k * u,
    line: company(groups, settings, si.value, si.u ?? 0, k),
    sentence: `It reads ${away} of the ${shown} predicted.`,
  };
}

/** Whether the reading lies among the kept trials at the same settings. */
function company(
  groups: SeriesView['groups'],
  settings: Readonly<Record<string, Reading>>,
  value: number,
  u: number,
  k: number,
): string | null {
  const keyOf = (at: Readonly<Record<string, Reading>>) =>
    Object.keys(settings)
      .map((id) => {
        const reading = at[id];
        const si = reading ? readSi(reading) : null;
        return si?.ok ? `${id}=${si.key}` : `${id}=?`;
      })
      .join(' ');
  const wanted = keyOf(settings);
  const same = groups.find((group) => keyOf(group.settings) === wanted);
  const kept = same?.lines.filter((line) => !line.trial.excluded && line.value !== null) ?? [];
  if (kept.length === 0) return 'The first at this setting.';
  const names = kept.length === 1 ? kept[0]?.name : `${kept[0]?.name} to ${kept.at(-1)?.name}`;
  const read = kept.map((line) => line.value ?? 0);
  const ownU = Math.max(u, ...kept.map((line) => line.u ?? 0));
  const isAmong = value >= Math.min(...read) - k * ownU && value <= Math.max(...read) + k * ownU;
  return isAmong ? `In line with ${names}.` : `Apart from ${names}.`;
}
