import { diffArrays } from 'diff';
import type { ComparedSide } from './compare-editions.ts';
import { compareWords, wholePassage } from './compare-words.ts';
import type { MovedPassage } from './edition-comparison.ts';
import { textBlocks, type TextBlock } from './text-blocks.ts';

/** Share of telling words that two passages must have in common to be one that changed, and not two. */
const ALIKE = 0.4;
/** Shorter words stand in every passage and tell nothing. */
const TELLING_LETTERS = 4;

/**
 * What moved in the report's words: the blocks of both sides are matched by their longest common subsequence, and a
 * block that stands in the place of a like one is compared word by word. A tied number is one word, whatever it
 * reads: that it reads otherwise is told among the numbers.
 */
export function comparePassages(before: ComparedSide, after: ComparedSide): MovedPassage[] {
  const passages: MovedPassage[] = [];
  let gone: readonly TextBlock[] = [];
  const changes = diffArrays(textBlocks(before), textBlocks(after), {
    comparator: (a, b) => a.key === b.key,
  });
  for (const { added, removed, value } of changes) {
    if (removed) {
      gone = value;
      continue;
    }
    passages.push(...replaced(gone, added ? value : []));
    gone = [];
  }
  return [...passages, ...replaced(gone, [])];
}

/** Blocks that went and blocks that came at one place, in reading order; what went stands before what came. */
function replaced(gone: readonly TextBlock[], come: readonly TextBlock[]): MovedPassage[] {
  const passages: MovedPassage[] = [];
  let nextGone = 0;
  let nextCome = 0;
  const tellUntil = (endGone: number, endCome: number) => {
    passages.push(
      ...gone.slice(nextGone, endGone).map((block) => wholePassage(block, 'removed')),
      ...come.slice(nextCome, endCome).map((block) => wholePassage(block, 'added')),
    );
    nextGone = endGone;
    nextCome = endCome;
  };
  come.forEach((block, place) => {
    const like = gone.findIndex((other, i) => i >= nextGone && areAlike(other, block));
    const other = gone[like];
    if (other === undefined) return;
    tellUntil(like, place);
    passages.push(compareWords(other, block));
    nextGone = like + 1;
    nextCome = place + 1;
  });
  tellUntil(gone.length, come.length);
  return passages;
}

function areAlike(a: TextBlock, b: TextBlock): boolean {
  if (a.kind !== b.kind || a.section !== b.section) return false;
  const [first, second] = [tellingWords(a), tellingWords(b)];
  const common = [...first].filter((key) => second.has(key)).length;
  return common > 0 && common / Math.max(first.size, second.size) >= ALIKE;
}

function tellingWords({ tokens }: TextBlock): Set<string> {
  const telling = tokens.filter(({ kind, key }) => kind !== 'text' || key.length >= TELLING_LETTERS);
  return new Set((telling.length > 0 ? telling : tokens).map(({ key }) => key));
}
