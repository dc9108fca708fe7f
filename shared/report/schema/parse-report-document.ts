import { Node as ProseMirrorNode } from '@tiptap/pm/model';
import type { ReportDocument } from './report-node.ts';
import { reportSchema } from './report-schema.ts';

/** A document that was accepted, or the sentence why not. */
export type ParsedReport =
  | { readonly ok: true; readonly document: ReportDocument; readonly node: ProseMirrorNode }
  | { readonly ok: false; readonly sentence: string };

/**
 * Reads a report document from JSON and checks every node and attribute of it.
 *
 * @param json - anything
 * @returns the document, and the same as a ProseMirror node; or why it was refused
 * @example parseReportDocument({ type: 'doc' }).ok // => false
 */
export function parseReportDocument(json: unknown): ParsedReport {
  try {
    const node = ProseMirrorNode.fromJSON(reportSchema(), json);
    if (node.type !== reportSchema().topNodeType) throw new RangeError(`it is a ${node.type.name}`);
    node.check();
    return { ok: true, document: node.toJSON() as ReportDocument, node };
  } catch (error) {
    const reason = error instanceof Error ? error.message : 'it cannot be read';
    return { ok: false, sentence: `This is not a report of schema version 1: ${reason}.` };
  }
}
