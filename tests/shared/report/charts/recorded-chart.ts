/** Runs a configuration through Chart.js on a context that only writes down what is drawn. */
import { Chart } from 'chart.js';
import type { ChartSize, ChartTheme } from '#shared/report/charts/chart-theme.ts';
import type { ComparisonChart } from '#shared/report/charts/comparison-chart-types.ts';
import { registerCharts } from '#shared/report/charts/register-charts.ts';

export const THEME: ChartTheme = {
  ink: '#10262d',
  ink2: '#3c525a',
  ink3: '#566a71',
  paper: '#fefffe',
  hair: '#dde4e3',
  water: '#086c9a',
  copper: '#8d4a00',
  leak: '#b0154f',
  uiFace: 'Hanken Grotesk',
  reportFace: 'STIX Two Text',
};

export interface DrawnText {
  readonly text: string;
  readonly x: number;
  readonly y: number;
  readonly font: string;
  readonly colour: unknown;
}

export interface DrawnArc {
  readonly x: number;
  readonly y: number;
  readonly radius: number;
}

export interface Recorded {
  readonly texts: readonly DrawnText[];
  readonly arcs: readonly DrawnArc[];
  /** Places on the drawing of a value of an axis. */
  readonly place: (axis: 'x' | 'y' | 'z', value: number) => number;
  readonly area: {
    readonly left: number;
    readonly right: number;
    readonly top: number;
    readonly bottom: number;
  };
}

const CHARACTER = 0.52;

export function recordChart(configuration: ComparisonChart, size: ChartSize): Recorded {
  registerCharts();
  const texts: DrawnText[] = [];
  const arcs: DrawnArc[] = [];
  const state = { font: '12px sans-serif', fillStyle: '#000' as unknown, textAlign: 'left' };
  const widthOf = (text: string) =>
    text.length * CHARACTER * Number(/([\d.]+)px/u.exec(state.font)?.[1] ?? 12);
  const known: Record<string, unknown> = {
    canvas: null,
    measureText: (text: string) => ({ width: widthOf(text) }),
    fillText: (text: string, x: number, y: number) =>
      texts.push({ text, x, y, font: state.font, colour: state.fillStyle }),
    arc: (x: number, y: number, radius: number) => arcs.push({ x, y, radius }),
    getLineDash: () => [],
  };
  const context = new Proxy(state as Record<string, unknown>, {
    get: (target, name: string) =>
      name in known ? known[name] : name in target ? target[name] : () => undefined,
    set: (target, name: string, value) => {
      target[name] = value;
      return true;
    },
  });
  const canvas = {
    ...size,
    style: {},
    getContext: () => context,
    getAttribute: () => null,
    setAttribute: () => undefined,
    addEventListener: () => undefined,
    removeEventListener: () => undefined,
  };
  known.canvas = canvas;
  const options = { ...configuration.options, devicePixelRatio: 1, events: [] };
  const chart = new Chart(canvas as never, { ...configuration, options } as ComparisonChart);
  const { x, y, z } = chart.scales;
  const { left, right, top, bottom } = chart.chartArea;
  return {
    texts,
    arcs,
    place: (axis, value) => ({ x, y, z })[axis]?.getPixelForValue(value) ?? NaN,
    area: { left, right, top, bottom },
  };
}
