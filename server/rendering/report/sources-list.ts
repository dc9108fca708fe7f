import { symbolToText } from '#shared/formatting/symbol.ts';
import type { InlineRun } from '../text/inline-run.ts';
import { drawLines, LinesOwner } from '../text/draw-lines.ts';
import { drawTable, type TableRow } from './draw-table.ts';
import { sourceWords } from './number-source-words.ts';
import { CELL, CELL_HEAD, HEADINGS, hueColour, textStyle } from './print-style.ts';
import type { RenderContext } from './render-context.ts';
import { symbolWords } from './symbol-words.ts';
import { layOutLines } from './text-block.ts';

const TITLE = 'Where the numbers come from';
const SPACE_ABOVE = 22;
const SPACE_BELOW = 2;

/** The list at the end: the letter of each tied number, its value, its source and how it was reduced. */
export function drawSourcesList(context: RenderContext): void {
  const { writer, flow, sources, left, width } = context;
  if (sources.all.length === 0) return;
  const face = HEADINGS[2];
  const title = layOutLines([{ kind: 'text', text: TITLE, style: textStyle(face) }], face, width);
  const heading = writer.element('H2', { title: TITLE });
  context.element.add(heading);
  flow.keepWithNext(SPACE_ABOVE, title.height + SPACE_BELOW, (y) => {
    writer.bookmark(context.outline, TITLE, y);
    drawLines(writer, title.lines, { x: left, y, owner: new LinesOwner(writer, heading, 'H2') });
  });
  const element = writer.element('Table');
  context.element.add(element);
  const head: TableRow = { cells: ['', 'Value', 'Source', 'Reduction'].map(headCell) };
  const symbols = new Set(context.evidence.quantities.map((row) => symbolToText(row.symbol)));
  const rows = sources.all.map((number): TableRow => {
    const { source, reduction } = sourceWords(number, context);
    const value = textStyle(CELL, 'ui', hueColour(number.shown.hue));
    return {
      cells: [
        { runs: [plain(number.letter)] },
        { runs: [{ kind: 'text', text: number.shown.text, style: value, whole: true }] },
        { runs: symbolWords(source, CELL) },
        { runs: symbolWords(reduction, CELL, symbols) },
      ],
    };
  });
  drawTable({ aligns: ['left', 'left', 'left', 'left'], head, rows }, element, context);
}

function headCell(text: string) {
  return {
    runs: text === '' ? [] : [{ kind: 'text' as const, text, style: textStyle(CELL_HEAD) }],
    isHead: true,
  };
}

function plain(text: string): InlineRun {
  return { kind: 'text', text, style: textStyle(CELL) };
}
