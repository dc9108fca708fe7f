import { length } from '../pdf/operators.ts';

/** A canvas transform: [a b c d e f] as in CanvasRenderingContext2D.transform. */
export type Matrix = readonly [number, number, number, number, number, number];

/** A full circle that is alone on its path, so that it can be drawn as a form. */
export interface LoneCircle {
  readonly x: number;
  readonly y: number;
  readonly radius: number;
}

const FULL_TURN = 2 * Math.PI;
const QUARTER = Math.PI / 2;
const ROUNDING = 1e-9;

/** Builds a path in page space: every point is transformed when it is added, as a canvas does. */
export class PathBuilder {
  private operators: string[] = [];
  private last: readonly [number, number] | null = null;
  circle: LoneCircle | null = null;

  get isEmpty(): boolean {
    return this.operators.length === 0;
  }

  get text(): string {
    return this.operators.join('\n');
  }

  private place(matrix: Matrix, x: number, y: number): string {
    const [a, b, c, d, e, f] = matrix;
    return `${length(a * x + c * y + e)} ${length(b * x + d * y + f)}`;
  }

  moveTo(matrix: Matrix, x: number, y: number): void {
    if (!Number.isFinite(x) || !Number.isFinite(y)) return;
    this.operators.push(`${this.place(matrix, x, y)} m`);
    this.last = [x, y];
  }

  lineTo(matrix: Matrix, x: number, y: number): void {
    if (!Number.isFinite(x) || !Number.isFinite(y)) return;
    this.circle = null;
    if (this.isEmpty) return this.moveTo(matrix, x, y);
    this.operators.push(`${this.place(matrix, x, y)} l`);
    this.last = [x, y];
  }

  curveTo(matrix: Matrix, x1: number, y1: number, x2: number, y2: number, x: number, y: number): void {
    this.circle = null;
    const points = [this.place(matrix, x1, y1), this.place(matrix, x2, y2), this.place(matrix, x, y)];
    this.operators.push(`${points.join(' ')} c`);
    this.last = [x, y];
  }

  quadraticTo(matrix: Matrix, x1: number, y1: number, x: number, y: number): void {
    const [fromX, fromY] = this.last ?? [x1, y1];
    const third = (from: number, control: number) => from + (2 / 3) * (control - from);
    this.curveTo(matrix, third(fromX, x1), third(fromY, y1), third(x, x1), third(y, y1), x, y);
  }

  rectangle(matrix: Matrix, x: number, y: number, width: number, height: number): void {
    this.circle = null;
    this.moveTo(matrix, x, y);
    this.lineTo(matrix, x + width, y);
    this.lineTo(matrix, x + width, y + height);
    this.lineTo(matrix, x, y + height);
    this.close();
    this.last = [x, y];
  }

  close(): void {
    if (!this.isEmpty && !this.circle) this.operators.push('h');
  }

  /** An arc as quarter turns of cubic curves. */
  arc(matrix: Matrix, x: number, y: number, radius: number, from: number, to: number, back: boolean): void {
    const sweep = sweepOf(from, to, back);
    const isWhole = Math.abs(sweep) >= FULL_TURN - ROUNDING;
    const alone = isWhole && this.isEmpty;
    const steps = Math.max(1, Math.ceil(Math.abs(sweep) / QUARTER - ROUNDING));
    const step = sweep / steps;
    const reach = (4 / 3) * Math.tan(step / 4);
    const point = (cos: number, sin: number) => [x + radius * cos, y + radius * sin] as const;
    const start = point(Math.cos(from), Math.sin(from));
    if (this.isEmpty) this.moveTo(matrix, ...start);
    else this.lineTo(matrix, ...start);
    for (let i = 0; i < steps; i++) {
      const [a, b] = [from + i * step, from + (i + 1) * step];
      const [cosA, sinA, cosB, sinB] = [Math.cos(a), Math.sin(a), Math.cos(b), Math.sin(b)];
      const control1 = point(cosA - reach * sinA, sinA + reach * cosA);
      const control2 = point(cosB + reach * sinB, sinB - reach * cosB);
      this.curveTo(matrix, ...control1, ...control2, ...point(cosB, sinB));
    }
    const [a, b, c, d, e, f] = matrix;
    const scale = Math.sqrt(Math.abs(a * d - b * c));
    this.circle = alone ? { x: a * x + c * y + e, y: b * x + d * y + f, radius: radius * scale } : null;
  }
}

function sweepOf(from: number, to: number, back: boolean): number {
  const turn = to - from;
  if (back) {
    if (turn <= -FULL_TURN) return -FULL_TURN;
    const rest = turn % FULL_TURN;
    return rest > 0 ? rest - FULL_TURN : rest;
  }
  if (turn >= FULL_TURN) return FULL_TURN;
  const rest = turn % FULL_TURN;
  return rest < 0 ? rest + FULL_TURN : rest;
}
