import { ReactNodeViewRenderer } from '@tiptap/react';
import { ChartBlock } from '#shared/report/schema/chart-node.ts';
import { ClaimBlock } from '#shared/report/schema/claim-node.ts';
import { Formula } from '#shared/report/schema/formula-node.ts';
import { Plate } from '#shared/report/schema/plate-node.ts';
import type { ReportNodeOverrides } from '#shared/report/schema/report-extensions.ts';
import { TrialsTable } from '#shared/report/schema/trials-table-node.ts';
import type { FindingsStore } from '#src/lib/findings/findings-store.ts';
import type { FoldedSections } from '../editor/folded-sections.ts';
import type { ReadingMarks } from '../editor/reading-marks.ts';
import { ChartBlockView } from './chart-block.tsx';
import { ClaimBlockView } from './claim-block.tsx';
import { FormulaBlock } from './formula-block.tsx';
import { InlineFormulaView } from './inline-formula-view.ts';
import { LiveValueView, type OpenValue } from './live-value-view.ts';
import { PlateBlock } from './plate-block.tsx';
import { sectionViews } from './section-view.ts';
import { TrialsTableBlock } from './trials-table-block.tsx';

interface NodeViewParts {
  readonly store: FindingsStore;
  /** null: nothing here ever moves. */
  readonly marks: ReadingMarks | null;
  readonly folded: FoldedSections;
  readonly onOpen: (value: OpenValue) => void;
}

/** The report's nodes with how they are drawn on screen. */
export function reportNodeViews({ store, marks, folded, onOpen }: NodeViewParts): ReportNodeOverrides {
  return {
    liveValue: LiveValueView.configure({ store, marks, onOpen }),
    inlineFormula: InlineFormulaView,
    formula: Formula.extend({ addNodeView: () => ReactNodeViewRenderer(FormulaBlock) }),
    chart: ChartBlock.extend({ addNodeView: () => ReactNodeViewRenderer(ChartBlockView) }),
    trialsTable: TrialsTable.extend({ addNodeView: () => ReactNodeViewRenderer(TrialsTableBlock) }),
    claim: ClaimBlock.extend({ addNodeView: () => ReactNodeViewRenderer(ClaimBlockView) }),
    plate: Plate.extend({ addNodeView: () => ReactNodeViewRenderer(PlateBlock) }),
    sections: sectionViews(folded),
  };
}
