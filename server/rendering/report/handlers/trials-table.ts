import { symbolToLatex } from '#shared/formatting/symbol.ts';
import type { TrialsTableNode } from '#shared/report/schema/report-node.ts';
import {
  trialsTable as trialsTableView,
  type TrialsTableColumn,
  type TrialsTableGroup,
  type TrialsTableRow,
  type TrialsTableView,
} from '#shared/report/trials-table.ts';
import { LinesOwner } from '../../text/draw-lines.ts';
import type { InlineRun } from '../../text/inline-run.ts';
import { layOutCaption } from '../caption.ts';
import { drawTable, type TableCell, type TableRow } from '../draw-table.ts';
import { formulaRuns } from '../inline-runs.ts';
import { noticeBlock } from '../notice.ts';
import { CELL, CELL_HEAD, INK_3, textStyle, WATER } from '../print-style.ts';
import type { BlockHandler } from '../render-context.ts';

const SPACE_ABOVE = 10;
const SPACE_BELOW = 8;
const CAPTION_GAP = 3;
/** A hollow circle with a cross: the mark of a trial that is left out. */
const EXCLUDED_MARK = '⊗';

/** The trials of a series: settings and readings, the mean once for each group, what is left out hollow with its reason. */
export const trialsTable: BlockHandler<TrialsTableNode> = (node, context) => {
  const { writer, flow, left, width } = context;
  const view = trialsTableView(node.attrs.series, context.evidence, context.findings);
  const number = context.numbers.tables.get(node.attrs.anchor) ?? 0;
  if (!view) {
    noticeBlock(`Table ${number} cannot be shown: its series is no longer in the evidence.`, context);
    return;
  }
  const element = writer.element('Table');
  context.element.add(element);
  const caption = layOutCaption(`Table ${number}`, node.attrs.caption || captionOf(view), width);
  const captionElement = writer.element('Caption');
  element.add(captionElement);
  flow.begin(SPACE_ABOVE, caption.height + CAPTION_GAP + 4 * CELL.leading);
  flow.lines(caption.lines, new LinesOwner(writer, captionElement, 'Caption'), { x: left }, 0);
  flow.y += CAPTION_GAP;
  drawTable(contentOf(view), element, context);
  flow.y += SPACE_BELOW;
};

function captionOf(view: TrialsTableView): string {
  const held = view.held === null ? '' : ` (${view.held})`;
  const name = view.name === '' ? '' : `, ${view.name}`;
  return `Trials of series ${view.letter}${name}${held}.`;
}

function contentOf(view: TrialsTableView) {
  const readings = view.columns.filter((column) => column.kind === 'reading');
  const withReason = view.excluded > 0;
  const head: TableRow = {
    cells: [
      headCell('Trial'),
      ...view.columns.map((column) => ({ runs: columnHead(column), isHead: true })),
      ...readings.map((column) => ({ runs: [...headRuns('mean '), ...columnHead(column)], isHead: true })),
      ...(withReason ? [headCell('Left out because')] : []),
    ],
  };
  const aligns = [
    'left' as const,
    ...view.columns.map(() => 'right' as const),
    ...readings.map(() => 'right' as const),
    ...(withReason ? ['left' as const] : []),
  ];
  const rows = view.groups.flatMap((group) => groupRows(group, readings.length, withReason));
  return { aligns, head, rows };
}

function headRuns(text: string): InlineRun[] {
  return [{ kind: 'text', text, style: textStyle(CELL_HEAD), whole: true }];
}

function headCell(text: string): TableCell {
  return { runs: headRuns(text), isHead: true };
}

function columnHead(column: TrialsTableColumn): InlineRun[] {
  const symbol = formulaRuns(symbolToLatex(column.symbol), CELL_HEAD, CELL_HEAD.colour);
  return column.unit === '' ? symbol : [...symbol, ...headRuns(` / ${column.unit}`)];
}

function groupRows(group: TrialsTableGroup, readings: number, withReason: boolean): TableRow[] {
  const firstKept = group.rows.findIndex((row) => row.excluded === null);
  return group.rows.map((row, i) => ({
    cells: [
      ...ownCells(row),
      ...Array.from({ length: readings }, (_, j) =>
        textCell(i === firstKept ? (group.means[j] ?? '') : '', WATER),
      ),
      ...(withReason ? [textCell(row.excluded ?? '', INK_3)] : []),
    ],
    keepsWithNext: i < group.rows.length - 1 && group.rows.length <= 4,
  }));
}

function ownCells(row: TrialsTableRow): TableCell[] {
  const colour = row.excluded === null ? CELL.colour : INK_3;
  const name = row.excluded === null ? row.name : `${row.name} ${EXCLUDED_MARK}`;
  return [textCell(name, colour), ...row.cells.map((text) => textCell(text, colour))];
}

function textCell(text: string, colour: string): TableCell {
  return text === ''
    ? { runs: [] }
    : { runs: [{ kind: 'text', text, style: textStyle(CELL, 'ui', colour) }] };
}
