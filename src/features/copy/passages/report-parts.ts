import { blockNumbers } from '#shared/report/block-numbers.ts';
import { nodesOf } from '#shared/report/document-text.ts';
import type { Evidence } from '#shared/evidence/evidence.ts';
import type { ReportDocument } from '#shared/report/schema/report-node.ts';
import { findSection } from '#shared/report/schema/section-type.ts';

/** A part of the report that a question may be about. */
export interface ReportPart {
  readonly anchor: string;
  /** "Comparison", "formula 2". */
  readonly words: string;
}

/** Sections and numbered parts in the order in which they stand. */
export function reportParts(document: ReportDocument, evidence: Evidence): ReportPart[] {
  const { figures, plates, tables, formulas } = blockNumbers(document);
  const parts: ReportPart[] = [];
  const add = (anchor: string, kind: string, n: number | undefined) => {
    if (n !== undefined) parts.push({ anchor, words: `${kind} ${n}` });
  };
  for (const node of nodesOf(document)) {
    const section = findSection(node.type);
    if (section) parts.push({ anchor: String(section.number), words: section.name });
    else if (node.type === 'formula') add(node.attrs.anchor, 'formula', formulas.get(node.attrs.anchor));
    else if (node.type === 'chart') add(node.attrs.anchor, 'figure', figures.get(node.attrs.anchor));
    else if (node.type === 'plate') add(node.attrs.anchor, 'plate', plates.get(node.attrs.anchor));
    else if (node.type === 'trialsTable') add(node.attrs.anchor, 'table', tables.get(node.attrs.anchor));
    else if (node.type === 'claim') {
      const { claim, anchor } = node.attrs;
      add(anchor, 'claim', evidence.claims.find(({ id }) => id === claim)?.n);
    }
  }
  return parts;
}
