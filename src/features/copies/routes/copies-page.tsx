import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import type { Copy } from '#shared/contracts/copies.ts';
import type { ProblemSummary } from '#shared/contracts/teams.ts';
import { Loading } from '#src/components/loading.tsx';
import { Notice } from '#src/components/notice.tsx';
import { Word, WordLink } from '#src/components/word.tsx';
import { sentenceOf } from '#src/lib/api/api-error.ts';
import { paths } from '#src/lib/paths.ts';
import { useTeam } from '#src/lib/team/team-context.ts';
import { useTitle } from '#src/lib/use-title.ts';
import { teamCopiesQuery } from '../api/list-copies.ts';
import { CopyHead, CopyRow } from '../components/copy-row.tsx';
import { dayScale, DayScaleHead } from '../components/day-scale.tsx';
import { LendEdition } from '../components/lend-edition.tsx';
import { TakeBackDialog } from '../components/take-back-dialog.tsx';
import { borrowedSentence, isOut, outSentence, readerWords } from '../sentences/copy-words.ts';

/** Lending and copies: what is out, until when, and what is lent to us. */
export function CopiesPage({ problems }: { readonly problems: readonly ProblemSummary[] }) {
  const { team, role } = useTeam();
  const { data, error, refetch } = useQuery(teamCopiesQuery(team.slug));
  const [taking, setTaking] = useState<Copy | null>(null);
  const [now] = useState(() => new Date());
  const isCaptain = role === 'captain';
  useTitle('Copies', team.name);
  if (!data && !error) return <Loading what="the copies" />;
  const { lent, borrowed } = data ?? { lent: [], borrowed: [] };
  const scale = dayScale([...lent, ...borrowed], team.fights, now);
  return (
    <main
      id="page"
      tabIndex={-1}
      data-region="page"
      className="page-top mx-auto max-w-[1304px] px-8 pb-16 max-sm:px-0"
    >
      <header className="mb-5 max-sm:px-4.5">
        <h1 className="h1">Lending and copies</h1>
        {data && (
          <p className="mt-1 max-w-[840px] font-report text-report text-ink-2">
            {outSentence(lent)} {borrowedSentence(borrowed)}
          </p>
        )}
      </header>
      {error && (
        <Notice title="The copies could not be brought." className="my-4 max-sm:mx-4.5">
          {sentenceOf(error)} <Word onClick={() => void refetch()}>Try again</Word>
        </Notice>
      )}
      {data && (
        <>
          <section aria-labelledby="lent-by-us" className="page-sheet mb-6 px-8 pt-6 pb-3 max-sm:px-4.5">
            <CopyHead id="lent-by-us" title="Lent by us" other="To">
              <DayScaleHead scale={scale} />
            </CopyHead>
            <ul>
              {lent.toSorted(outFirst).map((copy) => (
                <CopyRow
                  key={copy.id}
                  copy={copy}
                  scale={scale}
                  who={copy.recipient}
                  words={readerWords(copy)}
                >
                  {isCaptain && isOut(copy) && (
                    <>
                      <WordLink
                        to={paths.copyPreview({ team: team.slug, number: copy.problem.number }, copy.id)}
                      >
                        See what they see
                        <span className="sr-only">, {copy.recipient}</span>
                      </WordLink>
                      <Word onClick={() => setTaking(copy)}>
                        Take back<span className="sr-only"> from {copy.recipient}</span>
                      </Word>
                    </>
                  )}
                </CopyRow>
              ))}
            </ul>
            {isCaptain && problems.length > 0 && <LendEdition problems={problems} />}
            {lent.length === 0 && (!isCaptain || problems.length === 0) && (
              <p className="py-4 font-report text-[17px]/6 text-ink-3 italic">
                Nothing was lent yet. The captain lends an edition once there is one.
              </p>
            )}
          </section>
          <section aria-labelledby="lent-to-us" className="page-sheet px-8 pt-6 pb-3 max-sm:px-4.5">
            <CopyHead id="lent-to-us" title="Lent to us" other="By">
              <DayScaleHead scale={scale} />
            </CopyHead>
            <ul>
              {borrowed.map((copy) => (
                <CopyRow
                  key={copy.id}
                  copy={copy}
                  scale={scale}
                  who={copy.team}
                  words={`we are the ${copy.reader}; it opens by the address they gave`}
                />
              ))}
            </ul>
            {borrowed.length === 0 && (
              <p className="py-4 font-report text-[17px]/6 text-ink-3 italic">
                Nothing is lent to us by a team that is here. A copy from elsewhere opens by its address
                alone.
              </p>
            )}
          </section>
        </>
      )}
      {taking && <TakeBackDialog team={team.slug} copy={taking} onClose={() => setTaking(null)} />}
    </main>
  );
}

/** What is out stands before what is over; otherwise the newest first, as they come. */
function outFirst(a: Copy, b: Copy): number {
  return Number(isOut(b)) - Number(isOut(a));
}
