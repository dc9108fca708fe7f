import type { ChartConfiguration, ChartDataset } from 'chart.js';

/** A chart of ours: lines, points and the bars of the residual strip over linear axes. */
export type ComparisonChart = ChartConfiguration<'scatter' | 'line' | 'bar'>;

/** One of its datasets. */
export type ComparisonDataset = ChartDataset<'scatter' | 'line' | 'bar'>;
