import { shapeText } from '../fonts/shape-text.ts';
import { drawFormulaPart } from '../formulas/draw-formula.ts';
import { fillColour, length, strokeColour } from '../pdf/operators.ts';
import type { StructureElement } from '../pdf/pdf-document.ts';
import type { PdfWriter } from '../pdf/pdf-writer.ts';
import { TextPen } from '../pdf/text-pen.ts';
import { DASHED_ROOM, wordSpace } from './build-items.ts';
import type { FormulaRun, RunElement, TextRun, TextStyle } from './inline-run.ts';
import type { Segment, TextLine } from './layout-paragraph.ts';

type Run = TextRun | FormulaRun;

const UNDERLINE = 0.5;
const UNDERLINE_DROP = 0.18;
const LINK_HEIGHT = 1.2;
const LINK_ASCENT = 0.92;
const DASH = { width: 0.8, pattern: '[2 1.6] 0 d', ascent: 0.82, descent: 0.3 };

/** Where the lines of one text go, and the structure element they belong to; null: they are an artifact. */
export interface LinesPlace {
  readonly x: number;
  readonly y: number;
  /** Width in which lines are set right or centred; lines set left need none. */
  readonly width?: number;
  readonly align?: 'left' | 'center' | 'right';
  readonly owner: LinesOwner | null;
}

/**
 * The structure element of a text, and the elements of its links, formulas and references, which go on with the text
 * over a page's end.
 */
export class LinesOwner {
  private readonly inner = new Map<Run, StructureElement>();

  constructor(
    private readonly writer: PdfWriter,
    readonly element: StructureElement,
    readonly tag: string,
  ) {}

  elementOf(run: Run, kind: RunElement): StructureElement {
    const known = this.inner.get(run);
    if (known) return known;
    const alt = kind.tag === 'Formula' ? { alt: kind.alt } : {};
    const element = this.writer.element(kind.tag, alt);
    this.element.add(element);
    this.inner.set(run, element);
    return element;
  }
}

/** Draws lines below one another and returns the y below the last. */
export function drawLines(writer: PdfWriter, lines: readonly TextLine[], place: LinesPlace): number {
  let y = place.y;
  for (const line of lines) {
    const slack = (place.width ?? line.width) - line.width;
    const shift = place.align === 'center' ? slack / 2 : place.align === 'right' ? slack : 0;
    drawLine(writer, line, place.x + shift, y + line.ascent, place.owner);
    y += line.height;
  }
  return y;
}

function drawLine(writer: PdfWriter, line: TextLine, x: number, y: number, owner: LinesOwner | null): void {
  for (const stretch of stretchesOf(line.segments)) {
    const draw = () => drawSegments(writer, stretch.segments, x, y);
    if (!owner) {
      draw();
      continue;
    }
    const kind = stretch.run?.element;
    if (!stretch.run || !kind) {
      writer.content(owner.element, owner.tag, draw);
      continue;
    }
    const element = owner.elementOf(stretch.run, kind);
    writer.content(element, kind.tag, draw);
    if (kind.tag === 'Link') linkArea(writer, stretch.segments, x, y, stretch.run, kind.href, element);
  }
}

interface Stretch {
  /** The run, where it has a structure element of its own. */
  readonly run: Run | null;
  readonly segments: Segment[];
}

/** Neighbouring segments of one structure element. */
function stretchesOf(segments: readonly Segment[]): Stretch[] {
  const stretches: Stretch[] = [];
  for (const segment of segments) {
    const run = segment.box.run.element ? segment.box.run : null;
    const last = stretches.at(-1);
    if (last && last.run === run) last.segments.push(segment);
    else stretches.push({ run, segments: [segment] });
  }
  return stretches;
}

function drawSegments(writer: PdfWriter, segments: readonly Segment[], x: number, y: number): void {
  const pen = new TextPen(writer);
  for (const [i, { x: offset, box, space }] of segments.entries()) {
    const left = x + offset;
    if (box.kind === 'part') {
      const { size, colour } = box.run;
      drawFormulaPart(writer, pen, box.part, { x: left, y, size, colour });
      continue;
    }
    const { style } = box.run;
    const baseline = y - (style.rise ?? 0);
    const inset = box.run.dashed === undefined ? 0 : DASHED_ROOM;
    pen.text(box.shaped, style.size, left + inset, baseline, style.colour);
    if (space) pen.text(shapeText(style.stack, ' '), style.size, left + box.width, baseline, style.colour);
    if (box.run.underline !== undefined) {
      pen.end();
      const goesOn = space && segments[i + 1]?.box.run === box.run;
      const width = box.width + (goesOn ? wordSpace(style) : 0);
      underline(writer, left, baseline, width, style, box.run.underline);
    }
    if (box.run.dashed !== undefined) {
      pen.end();
      dashedBox(writer, left, baseline, box.width, style, box.run.dashed);
    }
  }
  pen.end();
}

function dashedBox(
  writer: PdfWriter,
  x: number,
  y: number,
  width: number,
  style: TextStyle,
  colour: string,
): void {
  const { size } = style;
  const box = [x, y - DASH.ascent * size, width, (DASH.ascent + DASH.descent) * size];
  const outline = `${box.map(length).join(' ')} re S`;
  writer.write(`q ${strokeColour(colour)} ${DASH.width} w ${DASH.pattern} ${outline} Q`);
}

function underline(
  writer: PdfWriter,
  x: number,
  y: number,
  width: number,
  style: TextStyle,
  colour: string,
): void {
  const line = `${length(x)} ${length(y + UNDERLINE_DROP * style.size)} ${length(width)} ${UNDERLINE} re f`;
  writer.write(`${fillColour(colour)} ${line}`);
}

function linkArea(
  writer: PdfWriter,
  segments: readonly Segment[],
  x: number,
  y: number,
  run: Run,
  href: string,
  element: StructureElement,
): void {
  const first = segments[0];
  const last = segments.at(-1);
  if (!first || !last || run.kind !== 'text') return;
  const { size } = run.style;
  const left = x + first.x;
  const width = last.x + last.box.width - first.x;
  const box = { x: left, y: y - LINK_ASCENT * size, width, height: LINK_HEIGHT * size };
  writer.link(box, href, run.text, element);
}
