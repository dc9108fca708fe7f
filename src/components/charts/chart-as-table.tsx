import { chartTable } from '#shared/report/charts/chart-table.ts';
import type { Evidence } from '#shared/evidence/evidence.ts';
import type { ChartFinding } from '#shared/evidence/findings.ts';
import { Cell, HeadCell, Table } from '#src/components/table.tsx';

interface ChartAsTableProps {
  readonly finding: ChartFinding;
  readonly evidence: Evidence;
  readonly caption: string;
}

/** The points of a chart in rows, in place of the drawing. */
export function ChartAsTable({ finding, evidence, caption }: ChartAsTableProps) {
  const { head, rows } = chartTable(finding, evidence, evidence.settings);
  const align = (i: number) => (i < head.length - 1 ? 'right' : 'left');
  return (
    <Table
      caption={caption}
      head={head.map((words, i) => (
        <HeadCell key={words} align={align(i)}>
          {words}
        </HeadCell>
      ))}
    >
      {rows.map((row, i) => (
        <tr key={i}>
          {row.map((text, j) => (
            <Cell key={j} align={align(j)} className="whitespace-nowrap">
              {text}
            </Cell>
          ))}
        </tr>
      ))}
    </Table>
  );
}
