import { Extension } from '@tiptap/core';
import { Plugin } from '@tiptap/pm/state';
import { findSection } from '#shared/report/schema/section-type.ts';
import type { FoldedSections } from './folded-sections.ts';

/** A section that the caret is put into unfolds: nobody writes where nothing is seen. */
export const UnfoldAtCaret = Extension.create<{ folded: FoldedSections | null }>({
  name: 'unfoldAtCaret',
  addOptions: () => ({ folded: null }),
  addProseMirrorPlugins() {
    const { folded } = this.options;
    return [
      new Plugin({
        view: () => ({
          update(view, before) {
            if (!view.hasFocus() || view.state.selection.eq(before.selection)) return;
            const { $head } = view.state.selection;
            const section = $head.depth > 0 ? findSection($head.node(1).type.name) : undefined;
            if (section) folded?.setFolded(section.name, false);
          },
        }),
      }),
    ];
  },
});
