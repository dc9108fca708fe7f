import type { Evidence } from '#shared/evidence/evidence.ts';
import type { Findings } from '#shared/evidence/findings.ts';
import type { BlockNumbers } from '#shared/report/block-numbers.ts';
import type { SettingNames } from '#shared/report/untied-numbers.ts';
import type { BlockNode } from '#shared/report/schema/report-node.ts';
import type { OutlineItem, StructureElement } from '../pdf/pdf-document.ts';
import type { PdfWriter } from '../pdf/pdf-writer.ts';
import type { NumberSources } from './number-sources.ts';
import type { PageFlow } from './page-flow.ts';

/** What every handler of a block is given. */
export interface RenderContext {
  readonly writer: PdfWriter;
  readonly flow: PageFlow;
  readonly evidence: Evidence;
  readonly findings: Findings;
  readonly numbers: BlockNumbers;
  readonly sources: NumberSources;
  /** Values that only name a setting, and so need not be tied. */
  readonly settings: SettingNames;
  /** Pictures by fingerprint. */
  readonly plates: ReadonlyMap<string, Uint8Array>;
  /** Element of the structure that the block is added to. */
  readonly element: StructureElement;
  /** Left edge and width of the text, in points. */
  readonly left: number;
  readonly width: number;
  /** Space above a paragraph. */
  readonly space: number;
  /** Bookmarks: the section's, below which headings hang. */
  readonly outline: OutlineItem;
  /** Draws blocks inside another one: lists. */
  readonly blocks: (nodes: readonly BlockNode[], context: RenderContext) => void;
}

/** Draws one kind of block. */
export type BlockHandler<Node extends BlockNode> = (node: Node, context: RenderContext) => void;
