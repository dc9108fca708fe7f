import type { Node } from '@tiptap/pm/model';
import { Decoration, DecorationSet } from '@tiptap/pm/view';
import type { MarginNote } from '#shared/contracts/notes.ts';
import type { Span } from '#shared/notes/find-quote.ts';
import { isSettled } from '#shared/notes/note-states.ts';
import { findSection } from '#shared/report/schema/section-type.ts';

/** Underlines and raised numbers; with hosts, also where each note follows its paragraph. */
export function drawMarks(
  doc: Node,
  notes: readonly MarginNote[],
  places: ReadonlyMap<string, Span | null>,
  hostOf: ((note: string) => HTMLElement) | null,
): DecorationSet {
  const marks = notes.flatMap((note) => {
    const place = places.get(note.id) ?? null;
    const host = hostOf ? [hostMark(doc, note, place, hostOf)] : [];
    return [...(place ? marksOf(note, place) : []), ...host];
  });
  return DecorationSet.create(doc, marks);
}

function marksOf({ id, n, state, anchor }: MarginNote, { from, to }: Span): Decoration[] {
  const settled = isSettled(state) ? ' noted-settled' : '';
  if (anchor.kind === 'block')
    return [Decoration.node(from, to, { class: `noted-block${settled}`, 'data-note-n': String(n) })];
  return [
    Decoration.inline(from, to, { class: `noted${settled}` }),
    Decoration.widget(to, () => raised(n), { key: `raised ${id} ${n}`, side: -1, ignoreSelection: true }),
  ];
}

/** The number is drawn by the style sheet, so that it is no part of the report's text. */
function raised(n: number): HTMLElement {
  const number = document.createElement('sup');
  number.className = 'note-raised';
  number.dataset.n = String(n);
  return number;
}

function hostMark(
  doc: Node,
  note: MarginNote,
  place: Span | null,
  hostOf: (note: string) => HTMLElement,
): Decoration {
  return Decoration.widget(endOfBlock(doc, note, place), () => hostOf(note.id), {
    key: `host ${note.id}`,
    side: 1,
    stopEvent: () => true,
    ignoreSelection: true,
  });
}

/** After the block of its section that a note is about; after the section's last when that is gone. */
function endOfBlock(doc: Node, { section }: MarginNote, place: Span | null): number {
  let end = doc.content.size;
  doc.forEach((child, offset) => {
    if (findSection(child.type.name)?.name !== section) return;
    end = offset + child.nodeSize - 1;
    child.forEach((block, inside) => {
      const from = offset + 1 + inside;
      if (place && from <= place.from && place.from < from + block.nodeSize) end = from + block.nodeSize;
    });
  });
  return end;
}
