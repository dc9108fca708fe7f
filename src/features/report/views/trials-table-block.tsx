import { NodeViewWrapper, type NodeViewProps } from '@tiptap/react';
import { trialsTable } from '#shared/report/trials-table.ts';
import type { TrialsTableAttributes } from '#shared/report/schema/trials-table-node.ts';
import { Notice } from '#src/components/notice.tsx';
import { useFindingsSnapshot } from '#src/lib/evidence/use-evidence.ts';
import { useNumbers } from '../components/report-context.ts';
import { Caption } from './caption.tsx';
import { SeriesTable } from './series-table.tsx';

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
          <SeriesTable view={view} />
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
