import type { EditorView } from '@tiptap/pm/view';
import type { Span } from '#shared/notes/find-quote.ts';
import { MAX_QUOTE } from '#shared/notes/note-anchor.ts';

/** A range as it reads on the page: numbers as they are shown, formulas as they are typed. */
export function saidWords(view: EditorView, { from, to }: Span): string {
  let words = '';
  view.state.doc.nodesBetween(from, to, (node, at) => {
    if (node.isText) words += (node.text ?? '').slice(Math.max(0, from - at), to - at);
    else if (node.isInline) words += atomWords(view, at, node.attrs.latex);
    else if (node.isTextblock && words !== '') words += ' ';
  });
  return words.trim().slice(0, MAX_QUOTE) || 'these words';
}

function atomWords(view: EditorView, at: number, latex: unknown): string {
  if (typeof latex === 'string') return latex;
  return view.nodeDOM(at)?.textContent ?? '';
}
