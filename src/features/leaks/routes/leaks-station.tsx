import { useQuery } from '@tanstack/react-query';
import { useMemo, useState } from 'react';
import { prepareLeaks } from '#shared/leaks/prepared-leak.ts';
import { Button } from '#src/components/button.tsx';
import { Loading } from '#src/components/loading.tsx';
import { Notice } from '#src/components/notice.tsx';
import { Word } from '#src/components/word.tsx';
import { sentenceOf } from '#src/lib/api/api-error.ts';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { documentQuery } from '#src/lib/report/document-query.ts';
import { useStationCup } from '#src/lib/station-cup.ts';
import { leaksQuery } from '../api/get-leaks.ts';
import { LeakFigure } from '../components/leak-figure.tsx';
import { QuestionRun } from '../components/question-run.tsx';
import { leakCount } from '../view/leak-count.ts';
import { useFoundLeaks } from '../view/use-found-leaks.ts';

/** Where an opponent will press, and what we say to it. */
export function LeaksStation() {
  const { address } = useProblem();
  const text = useQuery(documentQuery(address));
  const kept = useQuery(leaksQuery(address));
  const found = useFoundLeaks(text.data);
  const leaks = useMemo(
    () => (found.leaks && kept.data ? prepareLeaks(found.leaks, kept.data.answers, kept.data.marks) : null),
    [found.leaks, kept.data],
  );
  const [isAsking, setAsking] = useState(false);
  useStationCup(leaks ? `${leaks.filter(({ state }) => state === 'open').length} open` : null);
  const failure = text.error ?? kept.error ?? found.failure;
  if (!leaks && !failure) return <Loading what="the leaks" />;
  const asked = leaks?.flatMap((leak) => (leak.state === 'mended' ? [] : [leak])) ?? [];
  return (
    <main
      id="page"
      tabIndex={-1}
      data-region="page"
      className="page-top mx-auto max-w-[1384px] px-8 pb-16 max-sm:px-0"
    >
      <div className="page-sheet px-10 pt-[30px] pb-9 max-sm:px-4.5">
        <header className="flex flex-wrap items-start justify-between gap-x-6 gap-y-4">
          <div>
            <h1 className="font-report text-[30px]/9 font-medium tracking-[-.01em]">Where they will press</h1>
            {leaks && <p className="mt-0.5 font-report text-[17px]/[26px] text-ink-2">{leakCount(leaks)}</p>}
          </div>
          {asked.length > 0 && !isAsking && (
            <Button kind="main" onClick={() => setAsking(true)}>
              Dry run of the questions
            </Button>
          )}
        </header>
        {failure !== null && (
          <Notice title="The leaks could not be looked for." className="mt-6 max-w-[640px]">
            {sentenceOf(failure)}{' '}
            <Word
              onClick={() => {
                void text.refetch();
                void kept.refetch();
              }}
            >
              Try again
            </Word>
          </Notice>
        )}
        {leaks?.length === 0 && (
          <p className="mt-8 max-w-[610px] font-report text-report text-ink-3 italic">
            No claim, number or trial stands out yet. That is not the same as being right: write the report,
            log trials and set claims, and every place where they do not carry one another is asked about
            here.
          </p>
        )}
        {leaks &&
          leaks.length > 0 &&
          (isAsking && asked.length > 0 ? (
            <QuestionRun leaks={asked} onEnd={() => setAsking(false)} />
          ) : (
            <LeakFigure leaks={leaks} />
          ))}
      </div>
    </main>
  );
}
