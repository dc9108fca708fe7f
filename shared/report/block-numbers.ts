import type { BlockNode, ListItemNode, ReportDocument, SectionNode } from './schema/report-node.ts';

/** Numbers of the report's blocks by anchor, in the order in which they stand. */
export interface BlockNumbers {
  /** "Figure 4": charts. */
  readonly figures: ReadonlyMap<string, number>;
  /** "Plate 1": pictures. */
  readonly plates: ReadonlyMap<string, number>;
  /** "Table 2": trials tables. */
  readonly tables: ReadonlyMap<string, number>;
  /** "(3)": formulas that have a label. */
  readonly formulas: ReadonlyMap<string, number>;
}

/**
 * Numbers a report's figures, plates, tables and formulas, the same on screen and on paper.
 *
 * @param document - the report
 * @returns numbers from 1, each kind for itself
 * @example blockNumbers({ type: 'doc', content: [] }).figures.size // => 0
 */
export function blockNumbers(document: ReportDocument): BlockNumbers {
  const figures = new Map<string, number>();
  const plates = new Map<string, number>();
  const tables = new Map<string, number>();
  const formulas = new Map<string, number>();
  const give = (map: Map<string, number>, anchor: string) => map.set(anchor, map.size + 1);
  const visit = (node: SectionNode | BlockNode | ListItemNode): void => {
    if (node.type === 'chart') give(figures, node.attrs.anchor);
    else if (node.type === 'plate') give(plates, node.attrs.anchor);
    else if (node.type === 'trialsTable') give(tables, node.attrs.anchor);
    else if (node.type === 'formula' && node.attrs.label !== null) give(formulas, node.attrs.anchor);
    else if (holdsBlocks(node)) node.content?.forEach(visit);
  };
  document.content.forEach(visit);
  return { figures, plates, tables, formulas };
}

type BlockHolder = Extract<
  SectionNode | BlockNode | ListItemNode,
  { readonly content?: readonly (BlockNode | ListItemNode)[] }
>;

function holdsBlocks(node: SectionNode | BlockNode | ListItemNode): node is BlockHolder {
  return (
    node.type.startsWith('section') ||
    node.type === 'bulletList' ||
    node.type === 'orderedList' ||
    node.type === 'listItem'
  );
}
