import type { HeadingNode, InlineNode } from '#shared/report/schema/report-node.ts';
import { drawLines, LinesOwner } from '../../text/draw-lines.ts';
import { inlineRuns } from '../inline-runs.ts';
import { HEADINGS } from '../print-style.ts';
import type { BlockHandler } from '../render-context.ts';
import { layOutLines } from '../text-block.ts';

const SPACE_ABOVE = 12;
/** A paragraph brings its own space, and less of it stands below a heading. */
const SPACE_BELOW = -4;

/** The words of a sentence without its formulas and numbers, for bookmarks. */
export function plainWords(nodes: readonly InlineNode[] | undefined): string {
  return (nodes ?? [])
    .map((node) =>
      node.type === 'text' ? node.text : node.type === 'liveValue' ? (node.attrs.shown ?? '') : '',
    )
    .join('')
    .trim();
}

export const heading: BlockHandler<HeadingNode> = (node, context) => {
  const { writer, flow, left, width } = context;
  const face = HEADINGS[node.attrs.level];
  const { lines, height } = layOutLines(inlineRuns(node.content, face, context), face, width);
  if (lines.length === 0) return;
  const words = plainWords(node.content);
  const tag = `H${node.attrs.level + 1}`;
  const element = writer.element(tag, { title: words });
  context.element.add(element);
  flow.keepWithNext(SPACE_ABOVE, height + SPACE_BELOW, (y) => {
    if (words !== '') writer.bookmark(context.outline, words, y);
    drawLines(writer, lines, { x: left, y, owner: new LinesOwner(writer, element, tag) });
  });
};
