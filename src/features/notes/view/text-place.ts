import type { EditorState } from '@tiptap/pm/state';
import { contextOf, type Span } from '#shared/notes/find-quote.ts';
import type { TextPlace } from '#shared/notes/note-anchor.ts';
import { sectionText, toRange, toSpan } from '#shared/notes/section-text.ts';
import type { SectionName } from '#shared/report/schema/section-type.ts';
import { positionsIn } from '../plugin/positions.ts';

/** The place of a range as a note keeps it, with the words there; null when no words of the section lie in it. */
export function textPlaceOf(
  state: EditorState,
  section: SectionName,
  range: Span,
): { readonly place: TextPlace; readonly quote: string; readonly range: Span } | null {
  const read = sectionText(state.doc, section);
  const span = toSpan(read, range);
  const exact = span && toRange(read, span);
  const positions = positionsIn(state);
  if (!span || !exact || !positions) return null;
  const ends = { from: positions.toRelative(exact.from), to: positions.toRelative(exact.to) };
  const quote = read.text.slice(span.from, span.to);
  return { place: { ...ends, ...contextOf(read.text, span) }, quote, range: exact };
}
