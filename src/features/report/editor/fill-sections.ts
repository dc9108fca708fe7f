import { Extension } from '@tiptap/core';
import { Plugin } from '@tiptap/pm/state';
import { ySyncPluginKey } from '@tiptap/y-tiptap';
import { findSection } from '#shared/report/schema/section-type.ts';

/**
 * Gives an emptied section one paragraph to write in, and every section's last part a line below it. Only after one's
 * own change: if every client answered a change of others, each would add a paragraph of its own.
 */
export const FillSections = Extension.create({
  name: 'fillSections',
  addProseMirrorPlugins: () => [
    new Plugin({
      appendTransaction(transactions, _before, state) {
        const isOwn =
          transactions.some(({ docChanged }) => docChanged) &&
          !transactions.some((tr) => tr.getMeta(ySyncPluginKey));
        if (!isOwn) return null;
        const { tr } = state;
        state.doc.forEach((section, offset) => {
          if (!findSection(section.type.name)) return;
          if (section.lastChild !== null && !section.lastChild.isAtom) return;
          const paragraph = state.schema.nodes.paragraph?.create();
          if (paragraph) tr.insert(tr.mapping.map(offset + section.nodeSize - 1), paragraph);
        });
        return tr.docChanged ? tr : null;
      },
      props: {
        /** A click into a section that a merge has emptied gives it its line. */
        handleClick(view, _position, event) {
          const element =
            event.target instanceof Element ? event.target.closest('section[data-section]') : null;
          if (!element || !view.editable) return false;
          let at: number | null = null;
          view.state.doc.forEach((section, offset) => {
            if (section.childCount === 0 && view.nodeDOM(offset) === element) at = offset + 1;
          });
          const paragraph = view.state.schema.nodes.paragraph?.create();
          if (at === null || !paragraph) return false;
          view.dispatch(view.state.tr.insert(at, paragraph));
          return true;
        },
      },
    }),
  ],
});
