import { shapeText, stackHeights } from '../fonts/shape-text.ts';
import { fillColour, length, parseColour, strokeColour } from '../pdf/operators.ts';
import { TextPen } from '../pdf/text-pen.ts';
import { canvasFont } from './canvas-font.ts';
import { CanvasState } from './canvas-state.ts';
import { PathBuilder } from './path-builder.ts';

const CAPS: Readonly<Record<string, number>> = { butt: 0, round: 1, square: 2 };
const JOINS: Readonly<Record<string, number>> = { miter: 0, round: 1, bevel: 2 };
/** Distance of a circle's control points as a share of its radius. */
const CIRCLE = 0.5523;

/** The part of CanvasRenderingContext2D that Chart.js and our plugins use, writing PDF operators. */
export class PdfContext extends CanvasState {
  private path = new PathBuilder();

  beginPath(): void {
    this.path = new PathBuilder();
  }
  moveTo(x: number, y: number): void {
    this.path.moveTo(this.matrix, x, y);
  }
  lineTo(x: number, y: number): void {
    this.path.lineTo(this.matrix, x, y);
  }
  bezierCurveTo(x1: number, y1: number, x2: number, y2: number, x: number, y: number): void {
    this.path.curveTo(this.matrix, x1, y1, x2, y2, x, y);
  }
  quadraticCurveTo(x1: number, y1: number, x: number, y: number): void {
    this.path.quadraticTo(this.matrix, x1, y1, x, y);
  }
  rect(x: number, y: number, width: number, height: number): void {
    this.path.rectangle(this.matrix, x, y, width, height);
  }
  arc(x: number, y: number, radius: number, from: number, to: number, back = false): void {
    this.path.arc(this.matrix, x, y, radius, from, to, back);
  }
  closePath(): void {
    this.path.close();
  }

  clip(): void {
    if (!this.path.isEmpty) this.writer.write(`${this.path.text}\nW n`);
  }

  fill(): void {
    const paint = this.paint('fill');
    if (this.path.isEmpty || paint === null) return;
    this.writer.write(paint);
    this.writer.write(this.circleForm('f') ?? `${this.path.text}\nf`);
  }

  stroke(): void {
    const paint = this.paint('stroke');
    if (this.path.isEmpty || paint === null) return;
    const scale = this.scaleOfLines();
    const line = `${length(this.width * scale)} w ${CAPS[this.lineCap] ?? 0} J ${JOINS[this.lineJoin] ?? 0} j`;
    const dash = `[${this.dash.map((part) => length(part * scale)).join(' ')}] ${length(this.dashOffset * scale)} d`;
    this.writer.write(`${paint}\n${line} ${dash}`);
    this.writer.write(this.circleForm('S') ?? `${this.path.text}\nS`);
  }

  fillRect(x: number, y: number, width: number, height: number): void {
    this.withPath(() => {
      this.rect(x, y, width, height);
      this.fill();
    });
  }
  strokeRect(x: number, y: number, width: number, height: number): void {
    this.withPath(() => {
      this.rect(x, y, width, height);
      this.stroke();
    });
  }
  clearRect(): void {
    // Paper is white already.
  }

  measureText(text: string) {
    const { size, stack } = canvasFont(this.font);
    const width = shapeText(stack, text).width * size;
    const { ascent, descent, capHeight } = stackHeights(stack);
    return {
      width,
      actualBoundingBoxAscent: capHeight * size,
      actualBoundingBoxDescent: descent * size * 0.8,
      actualBoundingBoxLeft: 0,
      actualBoundingBoxRight: width,
      fontBoundingBoxAscent: ascent * size,
      fontBoundingBoxDescent: descent * size,
    };
  }

  /** Upright text only: no label of ours is turned. */
  fillText(text: string, x: number, y: number): void {
    if (text === '') return;
    const { size, stack } = canvasFont(this.font);
    const shaped = shapeText(stack, text);
    const width = shaped.width * size;
    const left =
      this.textAlign === 'center'
        ? x - width / 2
        : this.textAlign === 'right' || this.textAlign === 'end'
          ? x - width
          : x;
    const baseline = y + this.baselineShift(stack, size);
    const [a, b, c, d, e, f] = this.matrix;
    const pen = new TextPen(this.writer);
    const scale = this.scaleOfLines();
    const at = [a * left + c * baseline + e, b * left + d * baseline + f] as const;
    this.writer.write(this.opacity('fill', 1));
    pen.text(shaped, size * scale, ...at, String(this.fillStyle));
    pen.end();
  }
  strokeText(): void {
    // No label of ours is outlined.
  }

  private baselineShift(stack: Parameters<typeof stackHeights>[0], size: number): number {
    const { ascent, descent } = stackHeights(stack);
    if (this.textBaseline === 'middle') return ((ascent - descent) / 2) * size;
    if (this.textBaseline === 'top' || this.textBaseline === 'hanging') return ascent * size;
    if (this.textBaseline === 'bottom' || this.textBaseline === 'ideographic') return -descent * size;
    return 0;
  }

  private withPath(draw: () => void): void {
    const kept = this.path;
    this.path = new PathBuilder();
    draw();
    this.path = kept;
  }

  private paint(kind: 'fill' | 'stroke'): string | null {
    const style = String(kind === 'fill' ? this.fillStyle : this.strokeStyle);
    const { alpha } = parseColour(style);
    if (alpha * this.alpha === 0) return null;
    const operator = kind === 'fill' ? fillColour(style) : strokeColour(style);
    return `${this.opacity(kind, alpha)}\n${operator}`;
  }

  private opacity(kind: 'fill' | 'stroke', alpha: number): string {
    const opacity = Math.round(alpha * this.alpha * 1000) / 1000;
    return `/${kind === 'fill' ? this.writer.opacity(opacity, 1) : this.writer.opacity(1, opacity)} gs`;
  }

  /** Points are drawn again and again: one form for each radius. */
  private circleForm(operator: 'f' | 'S'): string | null {
    const { circle } = this.path;
    if (!circle) return null;
    const r = circle.radius;
    const k = r * CIRCLE;
    const curve = (points: readonly number[]) => `${points.map(length).join(' ')} c`;
    const operators = [
      `${length(r)} 0 m`,
      curve([r, k, k, r, 0, r]),
      curve([-k, r, -r, k, -r, 0]),
      curve([-r, -k, -k, -r, 0, -r]),
      curve([k, -r, r, -k, r, 0]),
      `h ${operator}`,
    ].join('\n');
    const name = this.writer.form(operators, r + 2);
    return `q 1 0 0 1 ${length(circle.x)} ${length(circle.y)} cm /${name} Do Q`;
  }
}
