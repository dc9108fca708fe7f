/** The report as JSON: what the server stores, sends and prints. Types only; parse with parseReportDocument. */
import type { ChartAttributes } from './chart-node.ts';
import type { ClaimAttributes } from './claim-node.ts';
import type { FormulaAttributes } from './formula-node.ts';
import type { InlineFormulaAttributes } from './inline-formula-node.ts';
import type { LiveValueAttributes } from './live-value-node.ts';
import type { PlateAttributes } from './plate-node.ts';
import type { SectionType } from './section-type.ts';
import type { TrialsTableAttributes } from './trials-table-node.ts';

/** A mark on text. */
export type ReportMark =
  | { readonly type: 'bold' }
  | { readonly type: 'italic' }
  | { readonly type: 'link'; readonly attrs: { readonly href: string } };

/** A run of text with equal marks. */
export interface TextNode {
  readonly type: 'text';
  readonly text: string;
  readonly marks?: readonly ReportMark[];
}

interface Marked {
  readonly marks?: readonly ReportMark[];
}
/** A line break inside a paragraph. */
export interface HardBreakNode extends Marked {
  readonly type: 'hardBreak';
}
/** A tied number. */
export interface LiveValueNode extends Marked {
  readonly type: 'liveValue';
  readonly attrs: LiveValueAttributes;
}
/** A formula inside a sentence. */
export interface InlineFormulaNode extends Marked {
  readonly type: 'inlineFormula';
  readonly attrs: InlineFormulaAttributes;
}
/** What stands in a line of text. */
export type InlineNode = TextNode | HardBreakNode | LiveValueNode | InlineFormulaNode;

/** A paragraph; without content when it is empty. */
export interface ParagraphNode {
  readonly type: 'paragraph';
  readonly content?: readonly InlineNode[];
}
/** A heading inside a section. */
export interface HeadingNode {
  readonly type: 'heading';
  readonly attrs: { readonly level: 2 | 3 };
  readonly content?: readonly InlineNode[];
}
/** An item of a list. */
export interface ListItemNode {
  readonly type: 'listItem';
  readonly content?: readonly BlockNode[];
}
/** A list with bullets. */
export interface BulletListNode {
  readonly type: 'bulletList';
  readonly content: readonly ListItemNode[];
}
/** A numbered list. */
export interface OrderedListNode {
  readonly type: 'orderedList';
  readonly attrs: { readonly start: number; readonly type: '1' | 'a' | 'A' | 'i' | 'I' | null };
  readonly content: readonly ListItemNode[];
}
/** A cell of a typed table. */
export interface TableCellNode {
  readonly type: 'tableCell' | 'tableHeader';
  readonly attrs: {
    readonly colspan: number;
    readonly rowspan: number;
    readonly colwidth: readonly number[] | null;
    readonly align: 'left' | 'right' | 'center' | null;
  };
  readonly content?: readonly InlineNode[];
}
/** A row of a typed table. */
export interface TableRowNode {
  readonly type: 'tableRow';
  readonly content?: readonly TableCellNode[];
}
/** A typed table. */
export interface TableNode {
  readonly type: 'table';
  readonly content: readonly TableRowNode[];
}
/** A formula on its own line. */
export interface FormulaNode {
  readonly type: 'formula';
  readonly attrs: FormulaAttributes;
}
/** A chart of the evidence. */
export interface ChartNode {
  readonly type: 'chart';
  readonly attrs: ChartAttributes;
}
/** The trials of a series as a table. */
export interface TrialsTableNode {
  readonly type: 'trialsTable';
  readonly attrs: TrialsTableAttributes;
}
/** A claim with its verdict. */
export interface ClaimNode {
  readonly type: 'claim';
  readonly attrs: ClaimAttributes;
}
/** A picture with its caption. */
export interface PlateNode {
  readonly type: 'plate';
  readonly attrs: PlateAttributes;
}

/** What stands in a section. */
export type BlockNode =
  | ParagraphNode
  | HeadingNode
  | BulletListNode
  | OrderedListNode
  | TableNode
  | FormulaNode
  | ChartNode
  | TrialsTableNode
  | ClaimNode
  | PlateNode;

/** One of the five sections; without content when it is empty. */
export interface SectionNode {
  readonly type: SectionType;
  readonly content?: readonly BlockNode[];
}

/** A whole report: the five sections in their order. */
export interface ReportDocument {
  readonly type: 'doc';
  readonly content: readonly SectionNode[];
}

/** Any node of a report. */
export type ReportNode =
  ReportDocument | SectionNode | BlockNode | ListItemNode | TableRowNode | TableCellNode | InlineNode;
