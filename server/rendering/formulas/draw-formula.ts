import { factor, fillColour, length, strokeColour } from '../pdf/operators.ts';
import type { PdfWriter } from '../pdf/pdf-writer.ts';
import type { TextPen } from '../pdf/text-pen.ts';
import type { DrawingItem, FrameItem, LeafItem, RuleItem } from './formula-box.ts';
import type { FormulaPart } from './formula-layout.ts';
import { pathOperators } from './svg-path.ts';

/** Thinnest rule, in points: what a printer still shows. */
const THINNEST = 0.35;
/** Width of a line in KaTeX's strikes, in ems. */
const STRIKE = 0.046;

/** Where a part of a formula is drawn: its left end and baseline on the page, the size of its em, its colour. */
export interface FormulaPlace {
  readonly x: number;
  readonly y: number;
  readonly size: number;
  readonly colour: string;
}

/** Draws a part: glyphs with the pen, the rest after them. */
export function drawFormulaPart(
  writer: PdfWriter,
  pen: TextPen,
  part: FormulaPart,
  place: FormulaPlace,
): void {
  const others: LeafItem[] = [];
  for (const item of part.items) {
    if (item.kind !== 'glyph') {
      others.push(item);
      continue;
    }
    pen.glyphs({
      face: item.face,
      size: item.size * place.size,
      x: place.x + item.x * place.size,
      y: place.y + item.y * place.size,
      colour: item.colour ?? place.colour,
      glyphs: [item.glyph],
      advances: null,
    });
  }
  if (others.length === 0) return;
  pen.end();
  writer.write(others.map((item) => shapeOperators(item, place)).join('\n'));
}

function shapeOperators(item: LeafItem, place: FormulaPlace): string {
  if (item.kind === 'rule') return ruleOperators(item, place);
  if (item.kind === 'frame') return frameOperators(item, place);
  if (item.kind === 'drawing') return drawingOperators(item, place);
  return '';
}

function rectangle(item: RuleItem | FrameItem, place: FormulaPlace, least: number): string {
  const { x, y, size } = place;
  const height = Math.max(item.height * size, least);
  return `${length(x + item.x * size)} ${length(y + item.y * size)} ${length(item.width * size)} ${length(height)} re`;
}

function ruleOperators(item: RuleItem, place: FormulaPlace): string {
  return `${fillColour(item.colour ?? place.colour)} ${rectangle(item, place, THINNEST)} f`;
}

function frameOperators(item: FrameItem, place: FormulaPlace): string {
  const shape = rectangle(item, place, 0);
  const ground = item.ground === null ? '' : `${fillColour(item.ground)} ${shape} f`;
  const outline =
    item.line === 0
      ? ''
      : `${strokeColour(item.colour ?? place.colour)} ${length(item.line * place.size)} w ${shape} S`;
  return `q ${ground} ${outline} Q`;
}

function drawingOperators(item: DrawingItem, place: FormulaPlace): string {
  const { x, y, size } = place;
  const colour = item.colour ?? place.colour;
  const [left, top] = [x + item.x * size, y + item.y * size];
  const [width, height] = [item.width * size, item.height * size];
  return item.shapes
    .map((shape) => {
      if ('line' in shape) {
        const at = (text: string, whole: number) =>
          text.endsWith('%') ? (Number.parseFloat(text) / 100) * whole : Number.parseFloat(text) || 0;
        const { x1, y1, x2, y2 } = shape.line;
        const from = `${length(left + at(x1, width))} ${length(top + at(y1, height))} m`;
        const to = `${length(left + at(x2, width))} ${length(top + at(y2, height))} l`;
        return `q ${strokeColour(colour)} ${length(STRIKE * item.em * size)} w ${from} ${to} S Q`;
      }
      const fit = fitViewBox(item, width, height);
      const clip = `${length(left)} ${length(top)} ${length(width)} ${length(height)} re W n`;
      const matrix = `${factor(fit.scaleX)} 0 0 ${factor(fit.scaleY)} ${length(left + fit.x)} ${length(top + fit.y)} cm`;
      return `q ${clip} ${fillColour(colour)} ${matrix}\n${pathOperators(shape.path)}\nf Q`;
    })
    .join('\n');
}

/** How preserveAspectRatio fits a view box into its rectangle. */
function fitViewBox(item: DrawingItem, width: number, height: number) {
  const [, , boxWidth = width, boxHeight = height] = item.viewBox ?? [];
  const [scaleX, scaleY] = [width / boxWidth, height / boxHeight];
  if (item.aspect === 'none') return { scaleX, scaleY, x: 0, y: 0 };
  const scale = item.aspect.includes('slice') ? Math.max(scaleX, scaleY) : Math.min(scaleX, scaleY);
  const shift = (slack: number, name: string) =>
    item.aspect.includes(`${name}Mid`) ? slack / 2 : item.aspect.includes(`${name}Max`) ? slack : 0;
  return {
    scaleX: scale,
    scaleY: scale,
    x: shift(width - boxWidth * scale, 'x'),
    y: shift(height - boxHeight * scale, 'Y'),
  };
}
