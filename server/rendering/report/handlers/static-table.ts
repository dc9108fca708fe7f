import type { TableCellNode, TableNode } from '#shared/report/schema/report-node.ts';
import { drawTable, type CellAlign, type TableCell, type TableRow } from '../draw-table.ts';
import { inlineRuns } from '../inline-runs.ts';
import { CELL, CELL_HEAD } from '../print-style.ts';
import type { BlockHandler, RenderContext } from '../render-context.ts';

const SPACE_ABOVE = 10;
const SPACE_BELOW = 8;

/** A table typed by the team. */
export const staticTable: BlockHandler<TableNode> = (node, context) => {
  const grid = gridOf(node, context);
  const columns = Math.max(
    0,
    ...grid.map((row) => row.cells.reduce((sum, cell) => sum + (cell.span ?? 1), 0)),
  );
  if (columns === 0) return;
  const first = grid[0];
  const head = first?.cells.every((cell) => cell.isHead) ? first : null;
  const element = context.writer.element('Table');
  context.element.add(element);
  context.flow.begin(SPACE_ABOVE, 0);
  const aligns = new Array<CellAlign>(columns).fill('left');
  drawTable({ aligns, head, rows: head ? grid.slice(1) : grid }, element, context);
  context.flow.y += SPACE_BELOW;
};

/** Rows of cells; where a cell reaches down, the rows below have an empty one in its place. */
function gridOf(node: TableNode, context: RenderContext): TableRow[] {
  const reaching = new Map<number, number>();
  return node.content.map((row) => {
    const cells: TableCell[] = [];
    let column = 0;
    const skipReached = () => {
      while ((reaching.get(column) ?? 0) > 0) {
        reaching.set(column, (reaching.get(column) ?? 0) - 1);
        cells.push({ runs: [] });
        column += 1;
      }
    };
    for (const cell of row.content ?? []) {
      skipReached();
      cells.push(cellOf(cell, context));
      for (let i = 0; i < cell.attrs.colspan; i++) {
        if (cell.attrs.rowspan > 1) reaching.set(column + i, cell.attrs.rowspan - 1);
      }
      column += cell.attrs.colspan;
    }
    skipReached();
    return { cells };
  });
}

function cellOf(cell: TableCellNode, context: RenderContext): TableCell {
  const isHead = cell.type === 'tableHeader';
  const runs = inlineRuns(cell.content, isHead ? CELL_HEAD : CELL, context);
  const align = cell.attrs.align;
  return { runs, span: cell.attrs.colspan, isHead, ...(align ? { align } : {}) };
}
