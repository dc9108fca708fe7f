import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import type { Edition } from '#shared/contracts/editions.ts';
import { Loading } from '#src/components/loading.tsx';
import { Notice } from '#src/components/notice.tsx';
import { Word } from '#src/components/word.tsx';
import { sentenceOf } from '#src/lib/api/api-error.ts';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { useStationCup } from '#src/lib/station-cup.ts';
import { editionsQuery } from '../api/list-editions.ts';
import { DraftRow } from '../components/draft-row.tsx';
import { EditionRow } from '../components/edition-row.tsx';
import { FreezeButton } from '../components/freeze-button.tsx';
import type { Worth } from '../sentences/worth-doing-words.ts';

interface EditionsStationProps {
  /** Who holds a copy of an edition. */
  readonly holdersOf?: (edition: Edition) => ReactNode;
  /** What else can be done with an edition. */
  readonly actionsFor?: (edition: Edition) => ReactNode;
  /** What other parts of the problem find worth doing before freezing. */
  readonly othersWorthDoing?: readonly Worth[];
}

/** The draft, then everything that was frozen, the newest first. */
export function EditionsStation({ holdersOf, actionsFor, othersWorthDoing }: EditionsStationProps) {
  const { address } = useProblem();
  const { data: editions, error, refetch } = useQuery(editionsQuery(address));
  useStationCup(editions ? `${editions.length === 0 ? 'none' : editions.length} frozen` : null);
  if (!editions && !error) return <Loading what="the editions" />;
  const latest = editions?.[0] ?? null;
  return (
    <main
      id="page"
      tabIndex={-1}
      data-region="page"
      className="page-top mx-auto max-w-[1304px] px-8 pb-16 max-sm:px-0"
    >
      <header className="mb-[22px] flex flex-wrap items-end justify-between gap-x-6 gap-y-4 max-sm:px-4.5">
        <div>
          <h1 className="h1">Editions</h1>
          <p className="mt-0.5 font-report text-report text-ink-2">
            What has been frozen, who holds a copy, and what has moved since.
          </p>
        </div>
        {editions && <FreezeButton latest={latest?.n ?? 0} />}
      </header>
      {error && !editions && (
        <Notice title="The editions could not be brought." className="my-4 max-sm:mx-4.5">
          {sentenceOf(error)} <Word onClick={() => void refetch()}>Try again</Word>
        </Notice>
      )}
      {editions && (
        <div className="page-sheet overflow-hidden">
          <DraftRow address={address} latest={latest} othersWorthDoing={othersWorthDoing} />
          <ol>
            {editions.map((edition) => (
              <EditionRow
                key={edition.n}
                address={address}
                edition={edition}
                holders={holdersOf?.(edition)}
                actions={actionsFor?.(edition)}
              />
            ))}
          </ol>
        </div>
      )}
    </main>
  );
}
