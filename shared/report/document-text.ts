/** Reading a report document: its nodes in order, and its text as a reader would count it. */
import type { ReportNode } from './schema/report-node.ts';

/**
 * Every node below and including one, in document order.
 *
 * @param node - any node of a report
 */
export function* nodesOf(node: ReportNode): Generator<ReportNode> {
  yield node;
  if (!('content' in node) || node.content === undefined) return;
  for (const child of node.content) yield* nodesOf(child);
}

/**
 * Words of text below a node; a live value or an inline formula counts as one word.
 *
 * @param node - any node of a report
 * @example countWords({ type: 'paragraph', content: [{ type: 'text', text: 'It lands short.' }] }) // => 3
 */
export function countWords(node: ReportNode): number {
  let words = 0;
  for (const { type, ...rest } of nodesOf(node)) {
    if (type === 'text') words += (rest as { text: string }).text.match(/[\p{L}\d]+/gu)?.length ?? 0;
    if (type === 'liveValue' || type === 'inlineFormula') words += 1;
  }
  return words;
}
