import type { Node } from '@tiptap/pm/model';
import type { MarginNote } from '#shared/contracts/notes.ts';
import { findQuote, isStillSaid, type Span } from '#shared/notes/find-quote.ts';
import { sectionText, toRange, toSpan, type SectionText } from '#shared/notes/section-text.ts';
import type { SectionName } from '#shared/report/schema/section-type.ts';

/** Reads each section of a document once, however many notes are beside it. */
export function sectionReader(doc: Node): (section: SectionName) => SectionText {
  const read = new Map<SectionName, SectionText>();
  return (section) => {
    const known = read.get(section) ?? sectionText(doc, section);
    read.set(section, known);
    return known;
  };
}

/**
 * Where what a note is about stands now; null when it is gone.
 *
 * @param candidate - where it should be: kept only while most of its words are still there
 */
export function findPlace(
  note: MarginNote,
  doc: Node,
  sectionOf: (section: SectionName) => SectionText,
  candidate: Span | null,
): Span | null {
  const { anchor } = note;
  if (anchor.kind === 'block') return findBlock(doc, anchor.block);
  const section = sectionOf(note.section);
  const span = candidate && candidate.from < candidate.to ? toSpan(section, candidate) : null;
  if (span && isStillSaid(anchor.quote, section.text.slice(span.from, span.to)))
    return toRange(section, span);
  const found = findQuote(section.text, anchor);
  return found && toRange(section, found);
}

function findBlock(doc: Node, block: string): Span | null {
  let place: Span | null = null;
  doc.descendants((node, at) => {
    if (!place && node.attrs.anchor === block) place = { from: at, to: at + node.nodeSize };
    return place === null && !node.isTextblock;
  });
  return place;
}
