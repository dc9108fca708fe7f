import type { ChartTheme } from './chart-theme.ts';

/** One stretch of a label. Symbols stand in the report's italic, their subscripts upright and lowered. */
export interface TextRun {
  readonly text: string;
  readonly style: 'plain' | 'symbol' | 'subscript';
}

/** The part of a 2D context that labels need; a browser's context and the PDF's both have it. */
export interface LabelContext {
  font: string;
  fillStyle: unknown;
  textAlign: unknown;
  textBaseline: unknown;
  measureText(text: string): { readonly width: number };
  fillText(text: string, x: number, y: number): void;
}

/** How a label is set. */
export interface LabelStyle {
  /** Size of the plain text in CSS pixels. */
  readonly size: number;
  readonly colour: string;
  readonly weight?: 400 | 600;
}

const SYMBOL_SCALE = 1.08;
const SUBSCRIPT_SCALE = 0.75;
const SUBSCRIPT_DROP = 0.22;

/** A plain stretch of a label. */
export function plain(text: string): TextRun {
  return { text, style: 'plain' };
}

function fontOf(run: TextRun, style: LabelStyle, theme: ChartTheme): string {
  if (run.style === 'symbol') return `italic 400 ${style.size * SYMBOL_SCALE}px ${theme.reportFace}`;
  if (run.style === 'subscript') return `400 ${style.size * SUBSCRIPT_SCALE}px ${theme.reportFace}`;
  return `${style.weight ?? 400} ${style.size}px ${theme.uiFace}`;
}

/** Width of a label in CSS pixels. */
export function richTextWidth(
  context: LabelContext,
  runs: readonly TextRun[],
  style: LabelStyle,
  theme: ChartTheme,
): number {
  let width = 0;
  for (const run of runs) {
    context.font = fontOf(run, style, theme);
    width += context.measureText(run.text).width;
  }
  return width;
}

/** Draws a label with its baseline at `y`; `align` says which point of it stands at `x`. */
export function drawRichText(
  context: LabelContext,
  runs: readonly TextRun[],
  at: { readonly x: number; readonly y: number; readonly align: 'left' | 'center' | 'right' },
  style: LabelStyle,
  theme: ChartTheme,
): void {
  const width = richTextWidth(context, runs, style, theme);
  let x = at.align === 'left' ? at.x : at.align === 'right' ? at.x - width : at.x - width / 2;
  context.fillStyle = style.colour;
  context.textAlign = 'left';
  context.textBaseline = 'alphabetic';
  for (const run of runs) {
    context.font = fontOf(run, style, theme);
    const drop = run.style === 'subscript' ? style.size * SUBSCRIPT_DROP : 0;
    context.fillText(run.text, x, at.y + drop);
    x += context.measureText(run.text).width;
  }
}

/** The words of a label without their setting, for tables and names. */
export function richTextWords(runs: readonly TextRun[]): string {
  return runs.map((run) => run.text).join('');
}
