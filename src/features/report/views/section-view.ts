import type { Node } from '@tiptap/core';
import { SectionNodes } from '#shared/report/schema/section-node.ts';
import { findSection, type SectionDefinition } from '#shared/report/schema/section-type.ts';
import type { FoldedSections } from '../editor/folded-sections.ts';
import { sectionContents } from './section-contents.ts';

/** The five sections with their numbered headings, each of which can fold; the vessels beside them are the page's. */
export function sectionViews(folded: FoldedSections): readonly Node[] {
  return SectionNodes.map((section) =>
    section.extend({
      addNodeView() {
        return ({ node }) => {
          const definition = findSection(node.type.name);
          if (!definition) throw new Error(`sectionViews: ${node.type.name} is no section`);
          let current = node;
          const { dom, contentDOM, held, word } = sectionElements(definition);
          const draw = () => {
            const isFolded = folded.get().has(definition.name);
            dom.classList.toggle('is-folded', isFolded);
            held.textContent = isFolded ? `folded: ${sectionContents(current)}` : '';
            word.textContent = isFolded ? 'Unfold' : 'Fold';
            word.setAttribute('aria-expanded', String(!isFolded));
          };
          word.addEventListener('click', () =>
            folded.setFolded(definition.name, !folded.get().has(definition.name)),
          );
          const stop = folded.subscribe(draw);
          draw();
          return {
            dom,
            contentDOM,
            update(next) {
              if (next.type !== node.type) return false;
              current = next;
              if (folded.get().has(definition.name)) draw();
              return true;
            },
            stopEvent: ({ target }) => target === word,
            ignoreMutation: (mutation) => !contentDOM.contains(mutation.target),
            destroy: stop,
          };
        };
      },
    }),
  );
}

function sectionElements({ name, number }: SectionDefinition) {
  const dom = document.createElement('section');
  dom.className = 'report-section';
  dom.dataset.section = name;
  dom.id = String(number);
  const head = document.createElement('div');
  head.className = 'report-section-head';
  head.contentEditable = 'false';
  const heading = document.createElement('h2');
  const figure = document.createElement('span');
  figure.textContent = String(number);
  heading.append(figure, name);
  const held = document.createElement('span');
  held.className = 'report-section-held';
  const word = document.createElement('button');
  word.type = 'button';
  word.className = 'report-fold';
  const contentDOM = document.createElement('div');
  contentDOM.id = `section-${number}-text`;
  word.setAttribute('aria-controls', contentDOM.id);
  word.setAttribute('aria-describedby', `section-${number}-name`);
  heading.id = `section-${number}-name`;
  head.append(heading, held, word);
  dom.append(head, contentDOM);
  return { dom, contentDOM, held, word };
}
