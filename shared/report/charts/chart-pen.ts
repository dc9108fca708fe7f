import type { Chart } from 'chart.js';
import type { LabelContext } from './rich-text.ts';

/** The part of a 2D context that our plugins draw with; a browser's context and the PDF's both have it. */
export interface ChartPen extends LabelContext {
  strokeStyle: unknown;
  lineWidth: number;
  save(): void;
  restore(): void;
  beginPath(): void;
  moveTo(x: number, y: number): void;
  lineTo(x: number, y: number): void;
  closePath(): void;
  arc(x: number, y: number, radius: number, from: number, to: number): void;
  setLineDash(lengths: number[]): void;
  fillRect(x: number, y: number, width: number, height: number): void;
  fill(): void;
  stroke(): void;
}

/** Where values lie on a drawn chart, in CSS pixels. */
export interface ChartPlace {
  readonly pen: ChartPen;
  readonly left: number;
  readonly right: number;
  /** Ends of the main plot, of the residual strip, and of the whole. */
  readonly plot: { readonly top: number; readonly bottom: number };
  readonly strip: { readonly top: number; readonly bottom: number };
  x(value: number): number;
  y(value: number): number;
  z(value: number): number;
}

/** Reads the places off a chart that has been laid out; null before that. */
export function placeOf(chart: Chart): ChartPlace | null {
  const { x, y, z } = chart.scales;
  if (!x || !y || !z) return null;
  return {
    pen: chart.ctx as ChartPen,
    left: chart.chartArea.left,
    right: chart.chartArea.right,
    plot: { top: y.top, bottom: y.bottom },
    strip: { top: z.top, bottom: z.bottom },
    x: (value) => x.getPixelForValue(value),
    y: (value) => y.getPixelForValue(value),
    z: (value) => z.getPixelForValue(value),
  };
}
