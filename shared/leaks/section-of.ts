import { nodesOf } from '#shared/report/document-text.ts';
import type { ReportDocument, ReportNode } from '#shared/report/schema/report-node.ts';
import { findSection, type SectionName } from '#shared/report/schema/section-type.ts';

/**
 * The first section that holds a node of the kind asked for; null when none does.
 *
 * @param document - the report
 * @param isWanted - tells the node by
 */
export function sectionOf(
  document: ReportDocument,
  isWanted: (node: ReportNode) => boolean,
): SectionName | null {
  for (const section of document.content) {
    for (const node of nodesOf(section)) if (isWanted(node)) return findSection(section.type)?.name ?? null;
  }
  return null;
}
