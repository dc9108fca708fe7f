import { Extension } from '@tiptap/core';
import { Plugin } from '@tiptap/pm/state';

/** Told to each number of a line when the caret or a press comes into that line. */
export const LINE_VISITED = 'line:visited';

const LINES = 'p, li, h2, h3, td, th';

/** Reading leaves no trace in the document: a line counts as read once the caret, or a press, has been in it. */
export const VisitedLines = Extension.create({
  name: 'visitedLines',
  addProseMirrorPlugins: () => [
    new Plugin({
      view({ dom }) {
        const page = dom.ownerDocument;
        const visit = () => {
          const anchor = page.getSelection()?.anchorNode ?? null;
          const element = anchor instanceof Element ? anchor : (anchor?.parentElement ?? null);
          const line = element && dom.contains(element) ? element.closest(LINES) : null;
          for (const number of line?.querySelectorAll('.lv[data-before]') ?? []) {
            number.dispatchEvent(new Event(LINE_VISITED));
          }
        };
        page.addEventListener('selectionchange', visit);
        return { destroy: () => page.removeEventListener('selectionchange', visit) };
      },
    }),
  ],
});
