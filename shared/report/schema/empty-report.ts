import type { ReportDocument } from './report-node.ts';
import { REPORT_SECTIONS } from './section-type.ts';

/**
 * A report in which nothing is written yet: five sections with one empty paragraph each.
 *
 * @example emptyReport().content.length // => 5
 */
export function emptyReport(): ReportDocument {
  return {
    type: 'doc',
    content: REPORT_SECTIONS.map(({ type }) => ({ type, content: [{ type: 'paragraph' }] })),
  };
}
