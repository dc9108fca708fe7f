import { NodeViewWrapper, type NodeViewProps } from '@tiptap/react';
import { trialsTable } from '#shared/report/trials-table.ts';
import type { TrialsTableAttributes } from '#shared/report/schema/trials-table-node.ts';
import { Notice } from '#src/components/notice.tsx';
import { QuantitySymbol } from '#src/components/quantity-symbol.tsx';
import { useFindingsSnapshot } from '#src/lib/evidence/use-evidence.ts';
import { useNumbers } from '../components/report-context.ts';
import { Caption } from './caption.tsx';

/** The trials of a series as they stand now, with the mean of each setting. */
export function TrialsTableBlock({ node, editor, updateAttributes, selected }: NodeViewProps) {
  const { anchor, series, caption } = node.attrs as TrialsTableAttributes;
  const { evidence, findings } = useFindingsSnapshot();
  const number = useNumbers().tables.get(anchor);
  const view = trialsTable(series, evidence, findings);
  return (
    <NodeViewWrapper as="figure" className="report-figure" id={anchor} data-selected={selected || undefined}>
      <div
        contentEditable={false}
        className="relative overflow-x-auto"
        role="region"
        aria-label={`Table ${number ?? ''}`.trim()}
        tabIndex={0}
      >
        {view ? (
          <Table view={view} />
        ) : (
          <Notice title="This series is gone.">Delete this table, or put in another.</Notice>
        )}
      </div>
      <Caption
        kind="Table"
        number={number}
        text={caption}
        isEditable={editor.isEditable}
        onKeep={(next) => updateAttributes({ caption: next })}
      />
    </NodeViewWrapper>
  );
}

function Table({ view }: { readonly view: NonNullable<ReturnType<typeof trialsTable>> }) {
  const readings = view.columns.filter(({ kind }) => kind === 'reading');
  return (
    <table className="w-full border-collapse font-ui text-sm">
      <thead>
        <tr className="border-b-[1.25px] border-ink text-left text-xs text-ink-2">
          <th scope="col" className="py-1.5 pr-3 font-[550]">
            Trial
          </th>
          {view.columns.map(({ quantity, symbol, unit }) => (
            <th key={quantity} scope="col" className="px-3 py-1.5 text-right font-[550]">
              <QuantitySymbol symbol={symbol} />
              {unit && ` / ${unit}`}
            </th>
          ))}
          {readings.map(({ quantity, symbol, unit }) => (
            <th key={`mean ${quantity}`} scope="col" className="py-1.5 pl-3 text-right font-[550]">
              mean <QuantitySymbol symbol={symbol} />
              {unit && ` / ${unit}`}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {view.groups.map((group) =>
          group.rows.map((row, index) => (
            <tr key={row.trial} className={index === group.rows.length - 1 ? 'border-b border-hair' : ''}>
              <td
                className={`py-[3px] pr-3 ${row.excluded === null ? '' : 'text-ink-3 line-through'}`}
                title={row.excluded ?? undefined}
              >
                {row.name}
              </td>
              {row.cells.map((cell, column) => (
                <td
                  key={view.columns[column]?.quantity}
                  className={`px-3 py-[3px] text-right whitespace-nowrap ${row.excluded !== null ? 'text-ink-3 line-through' : view.columns[column]?.kind === 'reading' ? 'text-measured' : ''}`}
                >
                  {cell}
                </td>
              ))}
              {readings.map(({ quantity }, column) => (
                <td
                  key={`mean ${quantity}`}
                  className="py-[3px] pl-3 text-right font-semibold whitespace-nowrap text-measured"
                >
                  {index === 0 ? group.means[column] : null}
                </td>
              ))}
            </tr>
          )),
        )}
      </tbody>
    </table>
  );
}
