import { NodeViewWrapper, type NodeViewProps } from '@tiptap/react';
import { lazy, Suspense } from 'react';
import type { ChartAttributes } from '#shared/report/schema/chart-node.ts';
import { Notice } from '#src/components/notice.tsx';
import { useFindingsSnapshot } from '#src/lib/evidence/use-evidence.ts';
import { useReportParts } from '../components/report-context.ts';
import { Caption } from './caption.tsx';

const ComparisonChartView = lazy(async () => ({
  default: (await import('#src/components/charts/comparison-chart-view.tsx')).ComparisonChartView,
}));

/** A chart of the evidence, drawn anew whenever its trials change. */
export function ChartBlockView({ node, editor, updateAttributes, selected }: NodeViewProps) {
  const { anchor, chart: id, caption } = node.attrs as ChartAttributes;
  const { evidence, findings } = useFindingsSnapshot();
  const { numbers, openReference } = useReportParts();
  const chart = evidence.charts.find((row) => row.id === id);
  const finding = findings.charts.get(id);
  return (
    <NodeViewWrapper as="figure" className="report-figure" id={anchor} data-selected={selected || undefined}>
      <div contentEditable={false}>
        {!chart || !finding ? (
          <Notice title="This chart is gone.">
            Its comparison was removed. Put in another from the sill, or delete this one.
          </Notice>
        ) : finding.fault ? (
          <Notice title="This chart cannot be drawn.">{finding.fault.sentence}</Notice>
        ) : (
          <Suspense fallback={<div className="aspect-[2/1]" />}>
            <ComparisonChartView chart={chart} finding={finding} onOpenPoint={openReference} />
          </Suspense>
        )}
      </div>
      <Caption
        kind="Figure"
        number={numbers.figures.get(anchor)}
        text={caption}
        isEditable={editor.isEditable}
        onKeep={(next) => updateAttributes({ caption: next })}
      />
    </NodeViewWrapper>
  );
}
