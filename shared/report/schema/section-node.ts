import { Node } from '@tiptap/core';
import { REPORT_SECTIONS, type SectionDefinition } from './section-type.ts';

/** The document: the five sections, each once, in their order. */
export const ReportDoc = Node.create({
  name: 'doc',
  topNode: true,
  content: REPORT_SECTIONS.map((section) => section.type).join(' '),
});

/**
 * The five section nodes. Their content is `block*` and never `block+`: when two people each delete one half of a
 * section at the same time, the merged section is empty, and the editor's binding deletes whatever its schema does
 * not allow from the shared document. An empty section is allowed, so it stays.
 */
export const SectionNodes: readonly Node[] = REPORT_SECTIONS.map(sectionNode);

function sectionNode({ type, name }: SectionDefinition): Node {
  return Node.create({
    name: type,
    content: 'block*',
    isolating: true,
    defining: true,
    selectable: false,
    draggable: false,
    parseHTML: () => [{ tag: `section[data-section="${name}"]` }],
    renderHTML: () => ['section', { 'data-section': name }, 0],
  });
}
