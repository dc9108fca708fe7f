import {
  BarController,
  BarElement,
  Chart,
  Filler,
  LineController,
  LineElement,
  LinearScale,
  PointElement,
  ScatterController,
} from 'chart.js';

/** Makes known to Chart.js what our charts are made of, and nothing else. Calling it again does no harm. */
export function registerCharts(): void {
  Chart.register(
    BarController,
    BarElement,
    Filler,
    LineController,
    LineElement,
    LinearScale,
    PointElement,
    ScatterController,
  );
  Chart.defaults.locale = 'en-GB';
}
