import { Extension, type Editor } from '@tiptap/core';
import type { Node as ProseMirrorNode } from '@tiptap/pm/model';
import { Plugin, PluginKey } from '@tiptap/pm/state';
import { Decoration, DecorationSet } from '@tiptap/pm/view';

/** A passage that a question is about. */
export interface AskedPassage {
  readonly from: number;
  readonly to: number;
  /** Number of the question; null: it is still being written. */
  readonly number: number | null;
  /** Drawn more strongly: its question is open. */
  readonly isOpen: boolean;
}

const key = new PluginKey<DecorationSet>('asked passages');

/** Underlines the passages that questions are about, each with its question's number. */
export const AskedPassages = Extension.create({
  name: 'askedPassages',
  addProseMirrorPlugins: () => [
    new Plugin<DecorationSet>({
      key,
      state: {
        init: () => DecorationSet.empty,
        apply(tr, before) {
          const passages = tr.getMeta(key) as readonly AskedPassage[] | undefined;
          return passages ? decorate(tr.doc, passages) : before;
        },
      },
      props: { decorations: (state) => key.getState(state) },
    }),
  ],
});

/** Shows these passages, and no others. */
export function showPassages(editor: Editor, passages: readonly AskedPassage[]): void {
  if (!editor.isDestroyed) editor.view.dispatch(editor.state.tr.setMeta(key, passages));
}

function decorate(doc: ProseMirrorNode, passages: readonly AskedPassage[]): DecorationSet {
  const end = doc.content.size;
  const inside = passages.filter(({ from, to }) => from < to && to <= end);
  return DecorationSet.create(
    doc,
    inside.flatMap(({ from, to, number, isOpen }) => [
      Decoration.inline(from, to, { class: isOpen ? 'asked asked-open' : 'asked' }),
      ...(number === null ? [] : [Decoration.widget(to, () => raised(number), { side: -1 })]),
    ]),
  );
}

function raised(number: number): HTMLElement {
  const sup = document.createElement('sup');
  sup.className = 'asked-number';
  sup.textContent = String(number);
  return sup;
}
