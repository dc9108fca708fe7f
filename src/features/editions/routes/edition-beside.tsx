import { useQuery } from '@tanstack/react-query';
import { useNavigate } from 'react-router-dom';
import type { Edition } from '#shared/contracts/editions.ts';
import { Loading } from '#src/components/loading.tsx';
import { Notice } from '#src/components/notice.tsx';
import { Select } from '#src/components/select.tsx';
import { Word, WordLink } from '#src/components/word.tsx';
import { sentenceOf } from '#src/lib/api/api-error.ts';
import { useEvidence } from '#src/lib/evidence/use-evidence.ts';
import { paths } from '#src/lib/paths.ts';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { useStationCup } from '#src/lib/station-cup.ts';
import { comparisonQuery } from '../api/compare-editions.ts';
import { editionsQuery } from '../api/list-editions.ts';
import { ComparisonView } from '../components/comparison-view.tsx';
import { EditionHead } from '../components/edition-head.tsx';

interface EditionBesideProps {
  readonly n: number;
  /** The edition it is laid beside; null: the draft. */
  readonly beside: number | null;
}

/** One edition laid beside the draft or another edition: what moved, in numbers and in words. */
export function EditionBeside({ n, beside }: EditionBesideProps) {
  const { address } = useProblem();
  const { data: editions, error, refetch } = useQuery(editionsQuery(address));
  useStationCup(`edition ${n}`);
  if (!editions && !error) return <Loading what="the edition" />;
  const edition = editions?.find((one) => one.n === n);
  return (
    <main
      id="page"
      tabIndex={-1}
      data-region="page"
      className="page-top mx-auto max-w-[1104px] px-8 pb-16 max-sm:px-0"
    >
      {edition && editions && (
        <>
          <EditionHead address={address} edition={edition} />
          <Beside editions={editions} n={n} beside={beside} />
        </>
      )}
      {editions && !edition && (
        <>
          <h1 className="h1 max-sm:px-4.5">There is no edition {n}</h1>
          <p className="mt-2 max-sm:px-4.5">
            <WordLink to={paths.station(address, 'editions')}>All editions</WordLink>
          </p>
        </>
      )}
      {!editions && error && (
        <Notice title="The edition could not be brought.">
          {sentenceOf(error)} <Word onClick={() => void refetch()}>Try again</Word>
        </Notice>
      )}
    </main>
  );
}

function Beside({ editions, n, beside }: EditionBesideProps & { readonly editions: readonly Edition[] }) {
  const { address } = useProblem();
  const { version } = useEvidence();
  const navigate = useNavigate();
  const [from, to] =
    beside !== null && beside < n ? ([beside, n] as const) : ([n, beside ?? 'draft'] as const);
  const { data, error, refetch, isPlaceholderData } = useQuery(comparisonQuery(address, from, to, version));
  return (
    <section
      aria-label={`What moved from edition ${from} to ${to === 'draft' ? 'the draft' : `edition ${to}`}`}
      aria-busy={isPlaceholderData}
      className="page-sheet mt-6 px-9 pt-6 pb-8 max-sm:px-4.5"
    >
      <div className="mb-6 flex flex-wrap items-end justify-between gap-x-6 gap-y-3 border-b border-rule pb-5">
        <p className="font-report text-report text-ink-2">
          What moved from edition {from} to {to === 'draft' ? 'the draft as it stands' : `edition ${to}`}.
        </p>
        <Select
          label={`Edition ${n} laid beside`}
          frameClassName="w-[220px]"
          value={beside === null ? 'draft' : String(beside)}
          onChange={({ target }) =>
            void navigate(
              paths.edition(address, n, target.value === 'draft' ? undefined : Number(target.value)),
              {
                replace: true,
              },
            )
          }
          options={[
            { value: 'draft', words: 'the draft' },
            ...editions
              .filter((one) => one.n !== n)
              .map((one) => ({ value: String(one.n), words: `edition ${one.n}` })),
          ]}
        />
      </div>
      {data && <ComparisonView address={address} comparison={data} />}
      {!data && !error && <Loading what="what moved" />}
      {!data && error && (
        <Notice title="What moved could not be brought.">
          {sentenceOf(error)} <Word onClick={() => void refetch()}>Try again</Word>
        </Notice>
      )}
    </section>
  );
}
