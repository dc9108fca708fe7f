import { nodesOf } from './document-text.ts';
import type { ReportDocument } from './schema/report-node.ts';

/**
 * Fingerprints of the pictures a report shows, each once, in the order of their first place.
 *
 * @param document - the report
 */
export function plateFingerprints(document: ReportDocument): string[] {
  const found = new Set<string>();
  for (const node of nodesOf(document)) if (node.type === 'plate') found.add(node.attrs.sha);
  return [...found];
}
