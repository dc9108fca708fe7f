import type { Node } from '@tiptap/pm/model';
import { findSection, type SectionName } from '#shared/report/schema/section-type.ts';
import type { Span } from './find-quote.ts';

/** Stands for a live value or an inline formula: it has no text of its own. */
const OBJECT_SIGN = '\uFFFC';

/** The text of one section as notes see it, and where each of its signs stands in the document. */
export interface SectionText {
  readonly text: string;
  /** Position before the sign at each index of the text. */
  readonly positions: readonly number[];
}

/**
 * Reads a section: text as it is, atoms as one object sign, a line break between blocks.
 *
 * @param doc - the whole report
 * @param section - which of its sections
 */
export function sectionText(doc: Node, section: SectionName): SectionText {
  let text = '';
  const positions: number[] = [];
  const add = (piece: string, at: number, step: 0 | 1) => {
    for (let index = 0; index < piece.length; index += 1) positions.push(at + index * step);
    text += piece;
  };
  doc.forEach((child, offset) => {
    if (findSection(child.type.name)?.name !== section) return;
    child.descendants((node, inside) => {
      const at = offset + 1 + inside;
      if (node.isText) add(node.text ?? '', at, 1);
      else if (node.isInline) add(OBJECT_SIGN, at, 0);
      else if (node.isTextblock && text !== '') add('\n', at, 0);
    });
  });
  return { text, positions };
}

/** A span of a section's text as positions of the document; null when it lies outside. */
export function toRange({ positions }: SectionText, { from, to }: Span): Span | null {
  const first = positions[from];
  const last = positions[to - 1];
  return first === undefined || last === undefined || to <= from ? null : { from: first, to: last + 1 };
}

/** The part of a section's text that lies between two positions of the document; null when none of it does. */
export function toSpan({ positions }: SectionText, range: Span): Span | null {
  const from = positions.findIndex((at) => at >= range.from);
  if (from < 0) return null;
  let to = from;
  while (to < positions.length && (positions[to] ?? Infinity) < range.to) to += 1;
  return to > from ? { from, to } : null;
}

/** In which section a position lies; null for none. */
export function sectionAt(doc: Node, position: number): SectionName | null {
  if (position < 0 || position > doc.content.size) return null;
  const { node } = doc.childAfter(position);
  return node ? (findSection(node.type.name)?.name ?? null) : null;
}
