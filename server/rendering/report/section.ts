import { findSection } from '#shared/report/schema/section-type.ts';
import type { SectionNode } from '#shared/report/schema/report-node.ts';
import { drawLines, LinesOwner } from '../text/draw-lines.ts';
import { INK_3, SECTION_HEADING, textStyle } from './print-style.ts';
import type { RenderContext } from './render-context.ts';
import { layOutLines } from './text-block.ts';

const SPACE_ABOVE = 17;
/** A paragraph brings its own space, and less of it stands below a heading. */
const SPACE_BELOW = -3;
const NUMBER_GAP = '\u2002';

/** A section: its number and name, then its blocks. A section in which nothing is written is left out. */
export function drawSection(node: SectionNode, context: RenderContext): void {
  const section = findSection(node.type);
  const blocks = (node.content ?? []).filter((block) => block.type !== 'paragraph' || block.content);
  if (!section || blocks.length === 0) return;
  const { writer, flow, left, width } = context;
  const element = writer.element('Sect', { title: section.name });
  context.element.add(element);
  const title = `${section.number} ${section.name}`;
  const heading = writer.element('H2', { title });
  element.add(heading);
  const style = textStyle(SECTION_HEADING);
  const { lines, height } = layOutLines(
    [
      { kind: 'text', text: `${section.number}${NUMBER_GAP}`, style: { ...style, colour: INK_3 } },
      { kind: 'text', text: section.name, style },
    ],
    SECTION_HEADING,
    width,
  );
  // The bookmark must be there before those of the headings below it, so it is made with a place of its own.
  const outline = { item: context.outline };
  flow.keepWithNext(SPACE_ABOVE, height + SPACE_BELOW, (y) => {
    outline.item = writer.bookmark(context.outline, title, y, true);
    drawLines(writer, lines, { x: left, y, owner: new LinesOwner(writer, heading, 'H2') });
  });
  context.blocks(blocks, {
    ...context,
    element,
    get outline() {
      return outline.item;
    },
  });
}
