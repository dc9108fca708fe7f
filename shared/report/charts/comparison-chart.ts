import type { Evidence, ProblemSettings } from '#shared/evidence/evidence.ts';
import type { ChartFinding } from '#shared/evidence/findings.ts';
import { axisTitles } from './axis-titles.ts';
import { comparisonScales, TOP } from './chart-scales.ts';
import { NARROW_BELOW, type ChartSize, type ChartTheme } from './chart-theme.ts';
import type { ComparisonChart } from './comparison-chart-types.ts';
import { comparisonDatasets } from './comparison-datasets.ts';
import { comparisonScene } from './comparison-scene.ts';
import { curveLabels } from './curve-labels.ts';
import { errorBars } from './error-bars.ts';
import { excludedMarks } from './excluded-marks.ts';
import { largestMark } from './largest-mark.ts';
import { residualStrip } from './residual-strip.ts';

/**
 * The Chart.js configuration of a comparison: measured points against the predicted curve, residuals below.
 * Fresh at every call, because Chart.js changes what it is given; the same on screen and in the PDF.
 *
 * @param finding - the chart's finding, without a fault
 * @param size - size of the drawing area in CSS pixels; it decides between the wide and the narrow form
 * @throws RangeError when an axis' quantity or its unit is not in the register: such a chart has a fault and is not drawn
 */
export function comparisonChart(
  finding: ChartFinding,
  evidence: Evidence,
  settings: ProblemSettings,
  theme: ChartTheme,
  size: ChartSize,
): ComparisonChart {
  const scene = comparisonScene(finding, evidence, settings);
  const narrow = size.width < NARROW_BELOW;
  const datasets = comparisonDatasets(scene, theme);
  const barIndex = datasets.findIndex((dataset) => dataset.label === 'residuals');
  return {
    type: 'scatter',
    data: { datasets },
    options: {
      responsive: false,
      maintainAspectRatio: false,
      animation: false,
      interaction: { mode: 'nearest', intersect: true },
      layout: { padding: { top: TOP, right: 4, bottom: 0, left: 0 } },
      plugins: { legend: { display: false }, tooltip: { enabled: false }, filler: { propagate: false } },
      scales: comparisonScales(scene, theme, size),
    },
    plugins: [
      largestMark(scene, theme),
      errorBars(scene, theme),
      excludedMarks(scene, theme),
      residualStrip(scene, theme, narrow, barIndex),
      axisTitles(scene, theme),
      ...(narrow ? [] : [curveLabels(scene, theme)]),
    ],
  };
}
