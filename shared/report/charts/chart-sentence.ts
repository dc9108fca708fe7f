import type { Chart } from '#shared/evidence/evidence.ts';
import type { ChartFinding } from '#shared/evidence/findings.ts';

/**
 * The one sentence that says what a chart shows: the team's own, else the computed one. It stands above the chart and
 * is the chart's name for who cannot see it.
 *
 * @example chartSentence({ id: 'c1', n: 1, comparison: 'k1', x: 'q1', sentence: ' Range against lean. ' }, undefined) // => 'Range against lean.'
 */
export function chartSentence(chart: Chart, finding: ChartFinding | undefined): string {
  const own = chart.sentence.trim();
  return own === '' ? (finding?.sentence ?? '') : own;
}
