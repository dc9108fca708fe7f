import { NodeSelection, type EditorState } from '@tiptap/pm/state';
import type { EditorView } from '@tiptap/pm/view';
import { occurrences, type Span } from '#shared/notes/find-quote.ts';
import { MAX_QUOTE, type NoteAnchor } from '#shared/notes/note-anchor.ts';
import { sectionAt, sectionText, toRange } from '#shared/notes/section-text.ts';
import { REPORT_SECTIONS, type SectionName } from '#shared/report/schema/section-type.ts';
import type { BlockChoice } from './block-choices.ts';
import { saidWords } from './said-words.ts';
import { textPlaceOf } from './text-place.ts';

/** What a new note is about, or a sentence that says why it cannot be about that. */
export type NoteSubject =
  { readonly section: SectionName; readonly anchor: NoteAnchor } | { readonly problem: string };

/** Whether words or a block are selected; what is there before anybody has selected anything is neither. */
export function hasSelected({ selection }: EditorState): boolean {
  if (selection instanceof NodeSelection) return true;
  const { empty, $from, $to } = selection;
  return !empty && $from.parent.inlineContent && $to.parent.inlineContent;
}

/** What is selected on the page; null when nothing is. */
export function selectedSubject(view: EditorView, blocks: readonly BlockChoice[]): NoteSubject | null {
  const { selection } = view.state;
  if (selection instanceof NodeSelection) {
    const block = blocks.find(({ anchor }) => anchor === selection.node.attrs.anchor);
    if (block) return blockSubject(block);
  }
  return hasSelected(view.state) ? subjectOf(view, selection) : null;
}

export function blockSubject({ section, anchor, words }: BlockChoice): NoteSubject {
  return { section, anchor: { kind: 'block', block: anchor, said: words } };
}

/** Words that were typed, wherever in the report they stand; they must stand there once. */
export function typedSubject(view: EditorView, words: string): NoteSubject {
  if (words === '')
    return { problem: 'Write the words that the note is about, as they stand in the report.' };
  const found = REPORT_SECTIONS.flatMap(({ name }) => {
    const read = sectionText(view.state.doc, name);
    return occurrences(read.text, words).flatMap((span) => toRange(read, span) ?? []);
  });
  const [only, second] = found;
  if (!only) return { problem: 'These words are not in the report. Write them as they stand there.' };
  if (second)
    return { problem: `These words stand at ${found.length} places. Write a few more that stand with them.` };
  return subjectOf(view, only);
}

function subjectOf(view: EditorView, range: Span): NoteSubject {
  const section = sectionAt(view.state.doc, range.from);
  if (!section || section !== sectionAt(view.state.doc, range.to - 1))
    return { problem: 'A note is about words of one section. Select fewer.' };
  const found = textPlaceOf(view.state, section, range);
  if (!found)
    return { problem: 'There are no words here. Select some, or choose a formula, figure or claim.' };
  if (found.quote.length > MAX_QUOTE)
    return { problem: `A note is about at most ${MAX_QUOTE} signs. Select the words that matter.` };
  const said = saidWords(view, found.range);
  return { section, anchor: { kind: 'text', ...found.place, quote: found.quote, said } };
}
