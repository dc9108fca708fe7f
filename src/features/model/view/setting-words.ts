import type { Comparison, Evidence, Reading } from '#shared/evidence/evidence.ts';
import { unitToText } from '#shared/formatting/unit-text.ts';

/** "38°": what distinguishes one setting from the others of its comparison. */
export function settingWords(
  settings: Readonly<Record<string, Reading>>,
  comparison: Comparison | null,
  evidence: Evidence,
): string {
  const series = evidence.series.filter(({ id }) => comparison?.selection.series.includes(id));
  const varied = new Set(series.flatMap((one) => one.settings.filter((id) => one.held[id] === undefined)));
  return Object.entries(settings)
    .filter(([id]) => varied.has(id))
    .map(([, { text, unit }]) =>
      unit === '1' ? text : unit === '°' ? `${text}°` : `${text}\u00a0${unitToText(unit)}`,
    )
    .join(', ');
}
