import { useQuery } from '@tanstack/react-query';
import { editionFigures } from '#shared/editions/edition-figures.ts';
import type { Edition } from '#shared/contracts/editions.ts';
import { useEvidence } from '#src/lib/evidence/use-evidence.ts';
import type { ProblemAddress } from '#src/lib/problem/problem-address.ts';
import { draftQuery } from '../api/get-draft.ts';
import { figureWords } from '../sentences/say-when.ts';
import type { Worth } from '../sentences/worth-doing-words.ts';
import { EDITION_GRID } from './edition-row.tsx';
import { MovedSince } from './moved-since.tsx';
import { WorthDoingSentence } from './worth-doing-sentence.tsx';

interface DraftRowProps {
  readonly address: ProblemAddress;
  readonly latest: Edition | null;
  readonly othersWorthDoing?: readonly Worth[] | undefined;
}

/** The draft stands first: what moved in it, and what is worth doing. */
export function DraftRow({ address, latest, othersWorthDoing }: DraftRowProps) {
  const evidence = useEvidence();
  const { data: document } = useQuery(draftQuery(address));
  return (
    <section aria-labelledby="draft" className={EDITION_GRID}>
      <div>
        <h2 id="draft" className="font-report text-[24px]/[30px] font-medium">
          Draft
        </h2>
        <p className="mt-0.5 text-sm text-ink-2">
          open, becomes edition {(latest?.n ?? 0) + 1}
          {document && (
            <>
              <br />
              {figureWords({ pages: null, ...editionFigures({ evidence, document }) })}
            </>
          )}
        </p>
      </div>
      <div className="min-w-0">
        {latest ? (
          <MovedSince address={address} n={latest.n} />
        ) : (
          <p className="font-report text-note text-ink-3 italic">
            Nothing is frozen yet. Edition 1 keeps the report, its trials and its verdicts as they stand on
            that day: to be printed, lent and laid beside the draft.
          </p>
        )}
      </div>
      <WorthDoingSentence address={address} {...(othersWorthDoing ? { others: othersWorthDoing } : {})} />
    </section>
  );
}
