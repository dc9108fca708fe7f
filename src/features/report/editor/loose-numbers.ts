import { Extension } from '@tiptap/core';
import type { Node as ProseMirrorNode } from '@tiptap/pm/model';
import { Plugin, PluginKey, type EditorState } from '@tiptap/pm/state';
import { Decoration, DecorationSet } from '@tiptap/pm/view';
import { findSection, type SectionName } from '#shared/report/schema/section-type.ts';
import { untiedNumbers, type SettingNames } from '#shared/report/untied-numbers.ts';

/** What an empty section says in place of its first line. */
const FIRST_LINES: Readonly<Record<SectionName, string>> = {
  Phenomenon: 'What do you think happens? One sentence, then a formula from the sill.',
  Model: 'Which law, and what does it leave out?',
  Experiment: 'What stands on the bench, and how is each quantity read?',
  Comparison: 'Where do trials and model agree, and where do they not?',
  Conclusion: 'Answer each verb of the task with a number.',
};

interface LooseNumbersOptions {
  readonly getSettings: () => SettingNames;
  /** Nobody can mend anything here: no first lines, and no advice. */
  readonly isForReading: boolean;
}

const LOOSE = 'This number follows no trial.';
const HOW_TO_TIE = 'Write its symbol and ± to tie it.';

const key = new PluginKey<DecorationSet>('loose numbers');

/** Numbers that follow no trial look unfinished; an empty section shows its first step. */
export const LooseNumbers = Extension.create<LooseNumbersOptions>({
  name: 'looseNumbers',
  addOptions: () => ({ getSettings: () => new Set<string>(), isForReading: false }),
  addProseMirrorPlugins() {
    const { getSettings, isForReading } = this.options;
    const decorate = (doc: ProseMirrorNode) => decorations(doc, getSettings(), isForReading);
    return [
      new Plugin<DecorationSet>({
        key,
        state: {
          init: (_config, { doc }) => decorate(doc),
          apply: (tr, before) => (tr.docChanged || tr.getMeta(key) === true ? decorate(tr.doc) : before),
        },
        props: { decorations: (state) => key.getState(state) },
      }),
    ];
  },
});

/** A transaction that looks again, after the settings of the evidence have changed. */
export function lookAgain(state: EditorState) {
  return state.tr.setMeta(key, true);
}

/** Where the loose numbers stand, in document order. */
export function looseNumbersOf(
  state: EditorState,
): readonly { readonly from: number; readonly to: number }[] {
  return key.getState(state)?.find(undefined, undefined, (spec) => spec.isLoose === true) ?? [];
}

function decorations(doc: ProseMirrorNode, settings: SettingNames, isForReading: boolean): DecorationSet {
  const found: Decoration[] = [];
  doc.descendants((node, position) => {
    if (node.isText) {
      for (const { from, to } of untiedNumbers(node.text ?? '', settings)) {
        found.push(
          Decoration.inline(
            position + from,
            position + to,
            { class: 'lv-untied', title: isForReading ? LOOSE : `${LOOSE} ${HOW_TO_TIE}` },
            { isLoose: true },
          ),
        );
      }
    }
    const section = findSection(node.type.name);
    const [only] = node.children;
    if (
      !isForReading &&
      section &&
      node.childCount === 1 &&
      only?.type.name === 'paragraph' &&
      only.content.size === 0
    ) {
      found.push(
        Decoration.node(position + 1, position + 1 + only.nodeSize, {
          class: 'first-line',
          'data-say': FIRST_LINES[section.name],
        }),
      );
    }
    return true;
  });
  return DecorationSet.create(doc, found);
}
