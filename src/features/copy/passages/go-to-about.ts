import type { Editor } from '@tiptap/core';
import type { QuestionAbout } from '#shared/contracts/copy-questions.ts';

/** Brings what a question is about into view. */
export function goToAbout(editor: Editor | null, about: QuestionAbout): void {
  if (about.kind === 'part') {
    document.getElementById(about.anchor)?.scrollIntoView({ block: 'start' });
    return;
  }
  if (!editor || about.from > editor.state.doc.content.size) return;
  const { node } = editor.view.domAtPos(about.from);
  const element = node instanceof Element ? node : node.parentElement;
  element?.scrollIntoView({ block: 'center' });
}
