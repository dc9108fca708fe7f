import { useState } from 'react';
import type { PreparedLeak } from '#shared/leaks/prepared-leak.ts';
import { countInWords } from '#shared/evidence/words.ts';
import { Word } from '#src/components/word.tsx';
import { leakRows } from '../view/leak-rows.ts';
import { LeakItem } from './leak-item.tsx';
import { Wall } from './wall.tsx';

/** Beyond so many, what is mended folds into one plug with its count. */
const MOST = 12;

/** One figure: the report as a vessel, and every question where its water lands. */
export function LeakFigure({ leaks }: { readonly leaks: readonly PreparedLeak[] }) {
  const [forward, setForward] = useState<string | null>(null);
  const [isUnfolded, setUnfolded] = useState(false);
  const mended = leaks.filter(({ state }) => state === 'mended').length;
  const isFolded = leaks.length > MOST && mended > 1 && !isUnfolded;
  const shown = isFolded ? leaks.filter(({ state }) => state !== 'mended') : leaks;
  const { rows, wall } = leakRows(shown);
  return (
    <>
      <div className="mt-12 grid grid-cols-[34px_92px_minmax(0,1fr)] max-sm:grid-cols-[0_20px_minmax(0,1fr)]">
        <ol className="contents" aria-label="Where they will press, the hardest first">
          {rows.map((leak) => (
            <LeakItem
              key={leak.key}
              leak={leak}
              stands={forward === null ? 'with the others' : forward === leak.key ? 'forward' : 'back'}
              onPress={() => setForward(forward === leak.key ? null : leak.key)}
            />
          ))}
        </ol>
        <Wall wall={wall} rows={rows.length} />
      </div>
      {isFolded && (
        <p className="mt-4 text-base text-ink-2">
          {countInWords(mended)} more are mended. <Word onClick={() => setUnfolded(true)}>Unfold them</Word>
        </p>
      )}
    </>
  );
}
