import type { PdfWriter } from '../pdf/pdf-writer.ts';
import type { Matrix } from './path-builder.ts';

interface PenState {
  readonly matrix: Matrix;
  readonly fillStyle: unknown;
  readonly strokeStyle: unknown;
  readonly lineWidth: number;
  readonly lineCap: string;
  readonly lineJoin: string;
  readonly dash: readonly number[];
  readonly dashOffset: number;
  readonly alpha: number;
  readonly font: string;
  readonly textAlign: unknown;
  readonly textBaseline: unknown;
}

/**
 * The state of a drawing context: styles, transform, and what save() keeps. Transforms are kept here, so that the page
 * sees only paths, text, q and Q. As in browsers, values that make no sense are ignored.
 */
export class CanvasState {
  fillStyle: unknown = '#000000';
  strokeStyle: unknown = '#000000';
  lineCap = 'butt';
  lineJoin = 'miter';
  miterLimit = 10;
  font = '12px sans-serif';
  textAlign: unknown = 'left';
  textBaseline: unknown = 'alphabetic';
  direction = 'ltr';
  globalCompositeOperation = 'source-over';
  protected width = 1;
  protected dash: readonly number[] = [];
  protected dashOffset = 0;
  protected alpha = 1;
  protected matrix: Matrix;
  private readonly base: Matrix;
  private readonly saved: PenState[] = [];

  /** @param scale - points for each CSS pixel */
  constructor(
    readonly canvas: unknown,
    protected readonly writer: PdfWriter,
    x: number,
    y: number,
    scale: number,
  ) {
    this.base = [scale, 0, 0, scale, x, y];
    this.matrix = this.base;
  }

  get lineWidth(): number {
    return this.width;
  }
  set lineWidth(value: number) {
    if (value > 0 && Number.isFinite(value)) this.width = value;
  }
  get lineDashOffset(): number {
    return this.dashOffset;
  }
  set lineDashOffset(value: number) {
    if (Number.isFinite(value)) this.dashOffset = value;
  }
  get globalAlpha(): number {
    return this.alpha;
  }
  set globalAlpha(value: number) {
    if (value >= 0 && value <= 1) this.alpha = value;
  }

  save(): void {
    const { matrix, fillStyle, strokeStyle, lineCap, lineJoin, dash, dashOffset, alpha, font } = this;
    const { textAlign, textBaseline, width: lineWidth } = this;
    this.saved.push({
      ...{ matrix, fillStyle, strokeStyle, lineWidth, lineCap, lineJoin, dash, dashOffset, alpha, font },
      ...{ textAlign, textBaseline },
    });
    this.writer.write('q');
  }

  restore(): void {
    const state = this.saved.pop();
    if (!state) return;
    const { lineWidth, ...rest } = state;
    Object.assign(this, rest);
    this.width = lineWidth;
    this.writer.write('Q');
  }

  transform(a: number, b: number, c: number, d: number, e: number, f: number): void {
    const m = this.matrix;
    this.matrix = [
      m[0] * a + m[2] * b,
      m[1] * a + m[3] * b,
      m[0] * c + m[2] * d,
      m[1] * c + m[3] * d,
      m[0] * e + m[2] * f + m[4],
      m[1] * e + m[3] * f + m[5],
    ];
  }
  translate(x: number, y: number): void {
    this.transform(1, 0, 0, 1, x, y);
  }
  scale(x: number, y: number): void {
    this.transform(x, 0, 0, y, 0, 0);
  }
  rotate(angle: number): void {
    const [cos, sin] = [Math.cos(angle), Math.sin(angle)];
    this.transform(cos, sin, -sin, cos, 0, 0);
  }
  setTransform(a: number, b: number, c: number, d: number, e: number, f: number): void {
    this.matrix = this.base;
    this.transform(a, b, c, d, e, f);
  }
  resetTransform(): void {
    this.matrix = this.base;
  }

  setLineDash(lengths: readonly number[]): void {
    const dash = [...lengths].map(Number);
    if (dash.some((part) => !(part >= 0) || !Number.isFinite(part))) return;
    this.dash = dash.length % 2 === 1 ? [...dash, ...dash] : dash;
  }
  getLineDash(): readonly number[] {
    return this.dash;
  }

  protected scaleOfLines(): number {
    const [a, b, c, d] = this.matrix;
    return Math.sqrt(Math.abs(a * d - b * c));
  }
}
