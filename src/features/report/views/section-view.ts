import type { Node } from '@tiptap/core';
import { SectionNodes } from '#shared/report/schema/section-node.ts';
import { findSection } from '#shared/report/schema/section-type.ts';

/** The five sections with their numbered headings; the vessels beside them are drawn by the page. */
export const SectionViews: readonly Node[] = SectionNodes.map((section) =>
  section.extend({
    addNodeView() {
      return ({ node }) => {
        const definition = findSection(node.type.name);
        const dom = document.createElement('section');
        dom.className = 'report-section';
        dom.dataset.section = definition?.name ?? '';
        dom.id = String(definition?.number ?? '');
        const heading = document.createElement('h2');
        heading.contentEditable = 'false';
        const number = document.createElement('span');
        number.textContent = String(definition?.number ?? '');
        heading.append(number, definition?.name ?? '');
        const contentDOM = document.createElement('div');
        dom.append(heading, contentDOM);
        return {
          dom,
          contentDOM,
          update: (next) => next.type === node.type,
          ignoreMutation: (mutation) => !contentDOM.contains(mutation.target),
        };
      };
    },
  }),
);
