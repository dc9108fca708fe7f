import type { Editor } from '@tiptap/react';
import { useEffect, type RefObject } from 'react';
import { notesIn } from '../plugin/margin-notes.ts';
import { stackNotes } from './stack-notes.ts';

/** Text begins a little below the top of its line. */
const LINE_ABOVE_NOTE = 3;
/** Of what is beside no words. */
const HEAD = 18;
const BELOW_LAST = 64;

/**
 * Keeps the notes of the margin at the height of their words while both change. Each element with `data-note` is moved
 * by its style alone: nothing is drawn again as one types.
 */
export function useNoteStack(
  editor: Editor,
  page: RefObject<HTMLElement | null>,
  margin: RefObject<HTMLElement | null>,
  isInText: boolean,
): void {
  useEffect(() => {
    const frame = page.current;
    const aside = margin.current;
    if (!frame || !aside || isInText) return undefined;
    let waiting = 0;
    const place = () => {
      waiting = 0;
      if (!editor.isDestroyed) placeNotes(editor, frame, aside);
    };
    const soon = () => {
      if (waiting === 0) waiting = requestAnimationFrame(place);
    };
    const sizes = new ResizeObserver(soon);
    sizes.observe(frame);
    const watch = () => {
      for (const note of aside.querySelectorAll('[data-note]')) sizes.observe(note);
      soon();
    };
    const changes = new MutationObserver(watch);
    changes.observe(aside, { childList: true, subtree: true });
    editor.on('transaction', soon);
    watch();
    return () => {
      cancelAnimationFrame(waiting);
      sizes.disconnect();
      changes.disconnect();
      editor.off('transaction', soon);
      frame.style.minHeight = '';
    };
  }, [editor, page, margin, isInText]);
}

function placeNotes(editor: Editor, frame: HTMLElement, aside: HTMLElement): void {
  const origin = frame.getBoundingClientRect().top;
  const elements = new Map(
    [...aside.querySelectorAll<HTMLElement>('[data-note]')].map((element) => [
      element.dataset.note ?? '',
      element,
    ]),
  );
  const wanted = [...elements].map(([id, element]) => ({
    id,
    top: Math.max(0, topOf(editor, id, element, origin) - origin - LINE_ABOVE_NOTE),
    height: element.offsetHeight,
  }));
  let bottom = 0;
  for (const { id, top, isLevel } of stackNotes(wanted)) {
    const element = elements.get(id);
    if (!element) continue;
    element.style.top = `${Math.round(top)}px`;
    element.toggleAttribute('data-level', isLevel);
    bottom = Math.max(bottom, top + element.offsetHeight);
  }
  frame.style.minHeight = bottom > 0 ? `max(70vh, ${Math.ceil(bottom + BELOW_LAST)}px)` : '';
}

/** Where in the view the words of a note begin: at its section's head when they are gone, or folded away. */
function topOf(editor: Editor, id: string, { dataset }: HTMLElement, origin: number): number {
  if (dataset.at !== undefined)
    return editor.view.coordsAtPos(Math.min(Number(dataset.at), editor.state.doc.content.size), 1).top;
  if (dataset.section === undefined) return origin + HEAD;
  const place = notesIn(editor.state).places.get(id);
  const section = editor.view.dom.querySelector(`[data-section="${dataset.section}"]`);
  const head = section?.getBoundingClientRect().top ?? 0;
  if (!place || section?.classList.contains('is-folded')) return head;
  return editor.view.coordsAtPos(place.from, 1).top;
}
