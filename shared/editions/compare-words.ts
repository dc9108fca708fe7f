import { diffArrays } from 'diff';
import type { MovedPassage, TextPiece } from './edition-comparison.ts';
import type { TextBlock, TextToken } from './text-blocks.ts';

/** Two passages that differ by more words than this are told one after the other, not word by word. */
const MOST_EDITS = 2000;
/** A stretch of so few words, alike only by chance, does not part two changes. */
const LEAST_WORDS = 3;

/** Words alike on both sides, or what stood and what stands in one place. */
interface Stretch {
  readonly same: readonly TextToken[];
  readonly removed: readonly TextToken[];
  readonly added: readonly TextToken[];
}

/** One passage before and after, word by word: at each place what went, then what came. */
export function compareWords(before: TextBlock, after: TextBlock): MovedPassage {
  const pieces = stretchesOf(before, after).flatMap(({ same, removed, added }) => [
    ...draw(same, 'same'),
    ...draw(removed, 'removed'),
    ...draw(added, 'added'),
  ]);
  return { section: after.section, change: 'changed', pieces: together(pieces) };
}

/** A passage that stands on one side only. */
export function wholePassage(block: TextBlock, change: 'added' | 'removed'): MovedPassage {
  return { section: block.section, change, pieces: together(draw(block.tokens, change)) };
}

function stretchesOf(before: TextBlock, after: TextBlock): Stretch[] {
  const changes = diffArrays([...before.tokens], [...after.tokens], {
    comparator: (a, b) => a.key === b.key,
    maxEditLength: MOST_EDITS,
  });
  if (!changes) return [{ same: [], removed: before.tokens, added: after.tokens }];
  const stretches: Stretch[] = [];
  changes.forEach(({ added, removed, value }, i) => {
    const isBetween = i > 0 && i < changes.length - 1;
    if (!added && !removed && !(isBetween && isChance(value))) {
      stretches.push({ same: value, removed: [], added: [] });
      return;
    }
    const last = stretches.at(-1);
    const open = last && last.same.length === 0 ? last : { same: [], removed: [], added: [] };
    if (last === open) stretches.pop();
    stretches.push({
      same: [],
      removed: added ? open.removed : [...open.removed, ...value],
      added: removed ? open.added : [...open.added, ...value],
    });
  });
  return stretches;
}

function isChance(tokens: readonly TextToken[]): boolean {
  return tokens.length < LEAST_WORDS && tokens.every(({ kind }) => kind === 'text');
}

function draw(tokens: readonly TextToken[], change: TextPiece['change']): TextPiece[] {
  return tokens.map(({ kind, text }) => ({ change, kind, text }));
}

/** Neighbouring words of one change as one piece. */
function together(pieces: readonly TextPiece[]): TextPiece[] {
  const joined: TextPiece[] = [];
  for (const piece of pieces) {
    const last = joined.at(-1);
    if (last?.kind === 'text' && piece.kind === 'text' && last.change === piece.change) {
      joined[joined.length - 1] = { ...last, text: last.text + piece.text };
    } else joined.push(piece);
  }
  return joined;
}
