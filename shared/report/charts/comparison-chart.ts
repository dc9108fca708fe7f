import type { ChartConfiguration } from 'chart.js';
import type { Evidence, ProblemSettings } from '#shared/evidence/evidence.ts';
import type { ChartFinding } from '#shared/evidence/findings.ts';
import type { ChartSize, ChartTheme } from './chart-theme.ts';

/** A chart of ours: lines, points and the bars of the residual strip over linear axes. */
export type ComparisonChart = ChartConfiguration<'scatter' | 'line' | 'bar'>;

/**
 * The Chart.js configuration of a comparison: measured points against the predicted curve, residuals below.
 * Fresh at every call, because Chart.js changes what it is given; the same on screen and in the PDF.
 *
 * @param finding - the chart's finding, without a fault
 * @param size - size of the drawing area in CSS pixels; it decides between the wide and the narrow form
 */
export function comparisonChart(
  _finding: ChartFinding,
  _evidence: Evidence,
  _settings: ProblemSettings,
  _theme: ChartTheme,
  _size: ChartSize,
): ComparisonChart {
  throw new Error('comparisonChart: not filled in yet');
}
