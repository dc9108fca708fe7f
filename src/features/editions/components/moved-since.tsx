import { useQuery } from '@tanstack/react-query';
import type { EditionComparison } from '#shared/editions/edition-comparison.ts';
import { Notice } from '#src/components/notice.tsx';
import { Word, WordLink } from '#src/components/word.tsx';
import { sentenceOf } from '#src/lib/api/api-error.ts';
import { useEvidence } from '#src/lib/evidence/use-evidence.ts';
import { paths } from '#src/lib/paths.ts';
import type { ProblemAddress } from '#src/lib/problem/problem-address.ts';
import { sayList } from '#src/lib/say/say-list.ts';
import { countOf } from '#src/lib/say/count-of.ts';
import { comparisonQuery } from '../api/compare-editions.ts';
import { MovedSentence, MovedValueLine, MovedVerdictLine } from './moved-value-line.tsx';

/** More numbers than this are counted here and shown where the edition lies beside the draft. */
const MOST_VALUES = 5;

/** What moved in the draft since the last edition, the numbers first. */
export function MovedSince({ address, n }: { readonly address: ProblemAddress; readonly n: number }) {
  const { version } = useEvidence();
  const { data, error, refetch } = useQuery(comparisonQuery(address, n, 'draft', version));
  return (
    <>
      <h3 className="mb-1 text-sm font-[650]">Moved since edition {n}</h3>
      {data && <MovedList address={address} n={n} comparison={data} />}
      {!data && !error && <p className="late text-sm text-ink-3 italic">Comparing</p>}
      {!data && error && (
        <Notice title="What moved could not be brought.">
          {sentenceOf(error)} <Word onClick={() => void refetch()}>Try again</Word>
        </Notice>
      )}
    </>
  );
}

interface MovedListProps {
  readonly address: ProblemAddress;
  readonly n: number;
  readonly comparison: EditionComparison;
}

function MovedList({ address, n, comparison }: MovedListProps) {
  const { values, verdicts, trials, definitions } = comparison;
  const others = values.length - MOST_VALUES;
  const sentences = [...trials, ...definitions];
  const words = passageWords(comparison);
  if (values.length + verdicts.length + sentences.length === 0 && words === null) {
    return <p className="text-sm text-ink-2">Nothing has moved since then.</p>;
  }
  return (
    <ul>
      {values.slice(0, MOST_VALUES).map((moved) => (
        <MovedValueLine key={moved.key} address={address} moved={moved} />
      ))}
      {verdicts.map((moved) => (
        <MovedVerdictLine key={moved.n} address={address} moved={moved} />
      ))}
      {sentences.map((sentence) => (
        <MovedSentence key={sentence} sentence={sentence} />
      ))}
      {(words !== null || others > 0) && (
        <li className="border-t border-hair py-1.5 text-sm first:border-t-0">
          {[others > 0 ? `${countOf(others, 'more number')}` : null, words].filter(Boolean).join('; ')}.{' '}
          <WordLink to={paths.edition(address, n)}>Lay beside</WordLink>
        </li>
      )}
    </ul>
  );
}

/** "Words moved in sections 4 and 5"; null when none did. */
function passageWords({ passages }: EditionComparison): string | null {
  const sections = [...new Set(passages.map(({ section }) => section))].sort((a, b) => a - b);
  if (sections.length === 0) return null;
  return `Words moved in ${sections.length === 1 ? 'section' : 'sections'} ${sayList(sections.map(String))}`;
}
