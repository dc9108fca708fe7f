import { fillColour, length } from '../pdf/operators.ts';
import type { StructureElement } from '../pdf/pdf-document.ts';
import type { PdfWriter } from '../pdf/pdf-writer.ts';
import { drawLines, LinesOwner } from '../text/draw-lines.ts';
import type { InlineRun } from '../text/inline-run.ts';
import { layOutParagraph, type TextLine } from '../text/layout-paragraph.ts';
import { CELL, HAIR, HAIR_LINE, INK, INK_LINE } from './print-style.ts';
import type { RenderContext } from './render-context.ts';

export type CellAlign = 'left' | 'right' | 'center';

/** One cell; it may reach over several columns. */
export interface TableCell {
  readonly runs: readonly InlineRun[];
  readonly span?: number;
  readonly align?: CellAlign;
  readonly isHead?: boolean;
}

export interface TableRow {
  readonly cells: readonly TableCell[];
  /** Keeps this row on the page of the next one. */
  readonly keepsWithNext?: boolean;
}

export interface TableContent {
  readonly aligns: readonly CellAlign[];
  readonly head: TableRow | null;
  readonly rows: readonly TableRow[];
}

const GUTTER = 14;
const PAD = 2.4;
const NATURAL = 1e5;
/** Most that a column is widened where there is room: rows are read across. */
const MOST_AIR = 40;

/** Draws a table, at most as wide as the text; its head is repeated where it goes on over a page. */
export function drawTable(table: TableContent, element: StructureElement, context: RenderContext): void {
  const all = table.head ? [table.head, ...table.rows] : table.rows;
  const widths = columnWidths(all, table.aligns.length, context.width);
  const total = spanWidth(widths, 0, widths.length);
  const set = (row: TableRow) => setRow(row, table.aligns, widths);
  const head = table.head ? set(table.head) : null;
  // The last row never stands alone on a page.
  const rows = table.rows.map((row, i) =>
    set(i === table.rows.length - 2 ? { ...row, keepsWithNext: true } : row),
  );
  const { writer, flow, left } = context;
  const headHeight = head?.height ?? 0;
  flow.begin(0, headHeight + heightTogether(rows, 0, 2));
  let section = head ? part('THead', element, writer) : null;
  if (head && section) {
    drawRow(writer, head, widths, left, flow.y, section);
    flow.y += head.height;
    line(writer, left, flow.y, total, INK, INK_LINE);
  }
  section = part('TBody', element, writer);
  rows.forEach((row, i) => {
    const needed = heightTogether(rows, i, 1);
    if (flow.y + needed > flow.frame.bottom) {
      flow.begin(0, needed + headHeight);
      if (head) {
        writer.artifact('Pagination', () => drawRow(writer, head, widths, left, flow.y, null));
        flow.y += head.height;
        line(writer, left, flow.y, total, INK, INK_LINE);
      }
    }
    drawRow(writer, row, widths, left, flow.y, section);
    flow.y += row.height;
    line(writer, left, flow.y, total, HAIR, HAIR_LINE);
  });
}

function part(type: 'THead' | 'TBody', element: StructureElement, writer: PdfWriter): StructureElement {
  const section = writer.element(type);
  element.add(section);
  return section;
}

interface SetCell {
  readonly lines: readonly TextLine[];
  readonly align: CellAlign;
  readonly column: number;
  readonly span: number;
  readonly isHead: boolean;
}

interface SetRow {
  readonly cells: readonly SetCell[];
  readonly height: number;
  readonly keepsWithNext: boolean;
}

/** Height of rows from one on: at least `count` of them, and on while a row keeps with the next. */
function heightTogether(rows: readonly SetRow[], from: number, count: number): number {
  let height = 0;
  for (let i = from; i < rows.length; i++) {
    const row = rows[i];
    if (!row) break;
    height += row.height;
    if (i - from + 1 >= count && !row.keepsWithNext) break;
  }
  return height;
}

function lay(runs: readonly InlineRun[], width: number): readonly TextLine[] {
  return layOutParagraph(runs, { width, leading: CELL.leading, align: 'left', hyphens: false });
}

function spanWidth(widths: readonly number[], from: number, span: number): number {
  return widths.slice(from, from + span).reduce((sum, width) => sum + width, 0);
}

function setRow(row: TableRow, aligns: readonly CellAlign[], widths: readonly number[]): SetRow {
  let column = 0;
  const cells = row.cells.map((cell): SetCell => {
    const span = cell.span ?? 1;
    const lines = lay(cell.runs, spanWidth(widths, column, span) - GUTTER);
    const align = cell.align ?? aligns[column] ?? 'left';
    const set = { lines, align, column, span, isHead: cell.isHead ?? false };
    column += span;
    return set;
  });
  const tallest = Math.max(
    CELL.leading,
    ...cells.map((cell) => cell.lines.reduce((sum, one) => sum + one.height, 0)),
  );
  return { cells, height: tallest + 2 * PAD, keepsWithNext: row.keepsWithNext ?? false };
}

/**
 * Widths of the columns: each as wide as its longest line where all of them fit, the rest shared out. Else the narrow
 * ones stay whole, and the wide ones share what is left, none narrower than its longest word.
 */
function columnWidths(rows: readonly TableRow[], count: number, width: number): number[] {
  const { natural, least } = measureColumns(rows, count);
  const sum = (values: readonly number[]) => values.reduce((total, value) => total + value, 0);
  const wanted = sum(natural);
  if (wanted <= width) return natural.map((one) => one + Math.min(MOST_AIR, (width - wanted) / count));
  const narrowFirst = natural.map((_, i) => i).toSorted((a, b) => (natural[a] ?? 0) - (natural[b] ?? 0));
  const widths = new Array<number>(count).fill(0);
  let left = width;
  narrowFirst.forEach((column, i) => {
    const share = left / (count - i);
    widths[column] = Math.max(Math.min(natural[column] ?? 0, share), least[column] ?? 0);
    left -= widths[column] ?? 0;
  });
  const scale = Math.min(1, width / sum(widths));
  return widths.map((one) => one * scale);
}

function measureColumns(rows: readonly TableRow[], count: number) {
  const natural = new Array<number>(count).fill(0);
  const least = new Array<number>(count).fill(0);
  for (const row of rows) {
    let column = 0;
    for (const cell of row.cells) {
      const span = cell.span ?? 1;
      if (span === 1) {
        const widest = (at: number) => Math.max(0, ...lay(cell.runs, at).map((one) => one.width)) + GUTTER;
        natural[column] = Math.max(natural[column] ?? 0, widest(NATURAL));
        least[column] = Math.max(least[column] ?? 0, widest(1));
      }
      column += span;
    }
  }
  return { natural, least };
}

function drawRow(
  writer: PdfWriter,
  row: SetRow,
  widths: readonly number[],
  left: number,
  top: number,
  section: StructureElement | null,
): void {
  const tr = section ? writer.element('TR') : null;
  if (section && tr) section.add(tr);
  for (const cell of row.cells) {
    const tag = cell.isHead ? 'TH' : 'TD';
    const element = tr ? writer.element(tag, cell.isHead ? { scope: 'Column' } : {}) : null;
    if (tr && element) tr.add(element);
    drawLines(writer, cell.lines, {
      x: left + spanWidth(widths, 0, cell.column),
      y: top + PAD,
      width: spanWidth(widths, cell.column, cell.span) - GUTTER,
      align: cell.align,
      owner: element ? new LinesOwner(writer, element, tag) : null,
    });
  }
}

function line(
  writer: PdfWriter,
  x: number,
  y: number,
  width: number,
  colour: string,
  strength: number,
): void {
  writer.artifact('Layout', () => {
    const rectangle = `${length(x)} ${length(y - strength / 2)} ${length(width)} ${strength} re f`;
    writer.write(`${fillColour(colour)} ${rectangle}`);
  });
}
