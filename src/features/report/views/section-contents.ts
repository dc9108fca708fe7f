import type { Node } from '@tiptap/pm/model';
import { countOf } from '#src/lib/say/count-of.ts';
import { sayList } from '#src/lib/say/say-list.ts';

/** Node types that are counted, in the order they are told. */
const PARTS = [
  ['paragraph', 'paragraph'],
  ['formula', 'formula'],
  ['chart', 'chart'],
  ['plate', 'plate'],
  ['trialsTable', 'table'],
  ['table', 'table'],
  ['claim', 'claim'],
] as const;

/** What a folded section holds, in small: "3 paragraphs, 1 plate and 1 claim"; empty paragraphs do not count. */
export function sectionContents(section: Node): string {
  const counts = new Map<string, number>();
  section.descendants((node) => {
    const noun = PARTS.find(([type]) => type === node.type.name)?.[1];
    if (noun === undefined) return true;
    if (noun !== 'paragraph' || node.content.size > 0) counts.set(noun, (counts.get(noun) ?? 0) + 1);
    return false;
  });
  const nouns = [...new Set(PARTS.map(([, noun]) => noun))];
  const words = nouns.flatMap((noun) => {
    const count = counts.get(noun);
    return count === undefined ? [] : [countOf(count, noun)];
  });
  return words.length === 0 ? 'nothing yet' : sayList(words);
}
