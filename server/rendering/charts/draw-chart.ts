import { Chart } from 'chart.js';
import type { ChartSize } from '#shared/report/charts/chart-theme.ts';
import type { ComparisonChart } from '#shared/report/charts/comparison-chart-types.ts';
import { registerCharts } from '#shared/report/charts/register-charts.ts';
import type { PdfWriter } from '../pdf/pdf-writer.ts';
import { PdfContext } from './pdf-context.ts';

/** Where a chart is drawn: its upper left corner in points, and how many points a CSS pixel has. */
export interface ChartPlaceOnPage {
  readonly x: number;
  readonly y: number;
  readonly scale: number;
}

/** Draws a chart as vectors by running its Chart.js configuration as it is. */
export function drawChart(
  writer: PdfWriter,
  chart: ComparisonChart,
  size: ChartSize,
  place: ChartPlaceOnPage,
): void {
  registerCharts();
  const canvas = {
    ...size,
    style: {},
    getContext: () => context,
    addEventListener: () => undefined,
    removeEventListener: () => undefined,
    getAttribute: () => null,
    setAttribute: () => undefined,
    removeAttribute: () => undefined,
    getBoundingClientRect: () => ({ left: 0, top: 0, ...size }),
  };
  const context: PdfContext = new PdfContext(canvas, writer, place.x, place.y, place.scale);
  writer.write('q');
  const configuration = {
    ...chart,
    options: { ...chart.options, devicePixelRatio: 1, events: [] },
  } as ComparisonChart;
  const drawn = new Chart(canvas as unknown as HTMLCanvasElement, configuration);
  drawn.destroy();
  writer.write('Q');
}
