import type { Extensions, Node } from '@tiptap/core';
import { ChartBlock } from './chart-node.ts';
import { ClaimBlock } from './claim-node.ts';
import { Formula } from './formula-node.ts';
import { InlineFormula } from './inline-formula-node.ts';
import { LiveValue } from './live-value-node.ts';
import { Plate } from './plate-node.ts';
import { ReportDoc, SectionNodes } from './section-node.ts';
import { TableNodes } from './table-nodes.ts';
import { TextKit } from './text-kit.ts';
import { TrialsTable } from './trials-table-node.ts';

/** The report's own nodes, which a client replaces by the same nodes with a node view. */
export interface ReportNodeOverrides {
  readonly liveValue?: Node;
  readonly inlineFormula?: Node;
  readonly formula?: Node;
  readonly chart?: Node;
  readonly trialsTable?: Node;
  readonly claim?: Node;
  readonly plate?: Node;
  /** In place of the five sections; all five or none. */
  readonly sections?: readonly Node[];
}

/**
 * Every extension that shapes a report's document, in one order for browser and server. Undo belongs to the
 * co-editing extension, so none is in here.
 *
 * @param overrides - nodes extended with a node view; their schema must stay as it is
 * @returns extensions for an editor, or for reportSchema()
 */
export function reportExtensions(overrides: ReportNodeOverrides = {}): Extensions {
  return [
    TextKit,
    ReportDoc,
    ...(overrides.sections ?? SectionNodes),
    ...TableNodes,
    overrides.liveValue ?? LiveValue,
    overrides.inlineFormula ?? InlineFormula,
    overrides.formula ?? Formula,
    overrides.chart ?? ChartBlock,
    overrides.trialsTable ?? TrialsTable,
    overrides.claim ?? ClaimBlock,
    overrides.plate ?? Plate,
  ];
}
