import { SEAL_SHAPE, sealMarks, type SealMark } from '#shared/editions/seal-marks.ts';
import { shapeText } from '../fonts/shape-text.ts';
import { factor, fillColour, length, strokeColour } from '../pdf/operators.ts';
import type { PdfWriter } from '../pdf/pdf-writer.ts';
import { TextPen } from '../pdf/text-pen.ts';
import { INK } from './print-style.ts';

/** Length of a handle that makes four cubic curves a circle, as a share of its radius. */
const ROUND = 0.5523;
const CENTRE = SEAL_SHAPE.side / 2;
/** Numbers of two figures and more are drawn smaller, so that they stay inside the ring. */
const SMALLER = 0.72;

/** Draws the seal of an edition in a square with its upper left corner at (x, y). */
export function drawSeal(
  writer: PdfWriter,
  edition: { readonly n: number; readonly seal: string },
  { x, y, side }: { readonly x: number; readonly y: number; readonly side: number },
): void {
  const scale = side / SEAL_SHAPE.side;
  const { markWidth, outerRadius, outerWidth, innerRadius, innerWidth, foot } = SEAL_SHAPE;
  writer.write(
    [
      `q ${factor(scale)} 0 0 ${factor(scale)} ${length(x)} ${length(y)} cm`,
      `1 J ${strokeColour(INK)} ${fillColour(INK)} ${markWidth} w`,
      ...sealMarks(edition.seal).map(mark),
      `${outerWidth} w ${circle(CENTRE, CENTRE, outerRadius)} S`,
      `${innerWidth} w ${circle(CENTRE, CENTRE, innerRadius)} S`,
      `0 J ${foot.width} w ${foot.from} ${foot.y} m ${foot.to} ${foot.y} l S`,
      'Q',
    ].join('\n'),
  );
  const text = shapeText('bodyMedium', String(edition.n));
  const size = SEAL_SHAPE.number.size * scale * (edition.n > 9 ? SMALLER : 1);
  const pen = new TextPen(writer);
  pen.text(text, size, x + (side - text.width * size) / 2, y + SEAL_SHAPE.number.y * scale, INK);
  pen.end();
}

function mark(drawn: SealMark): string {
  if (drawn.kind === 'dot') return `${circle(drawn.x, drawn.y, SEAL_SHAPE.dotRadius)} f`;
  return `${length(drawn.x1)} ${length(drawn.y1)} m ${length(drawn.x2)} ${length(drawn.y2)} l S`;
}

function circle(x: number, y: number, radius: number): string {
  const handle = radius * ROUND;
  const at = (dx: number, dy: number) => `${length(x + dx)} ${length(y + dy)}`;
  return [
    `${at(radius, 0)} m`,
    `${at(radius, handle)} ${at(handle, radius)} ${at(0, radius)} c`,
    `${at(-handle, radius)} ${at(-radius, handle)} ${at(-radius, 0)} c`,
    `${at(-radius, -handle)} ${at(-handle, -radius)} ${at(0, -radius)} c`,
    `${at(handle, -radius)} ${at(radius, -handle)} ${at(radius, 0)} c h`,
  ].join(' ');
}
