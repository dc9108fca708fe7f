import type { EditionComparison } from '#shared/editions/edition-comparison.ts';
import type { ProblemAddress } from '#src/lib/problem/problem-address.ts';
import { sayList } from '#src/lib/say/say-list.ts';
import { countInWords } from '#shared/evidence/words.ts';
import { MovedSentence, MovedValueLine, MovedVerdictLine } from './moved-value-line.tsx';
import { PassageList } from './passage-list.tsx';

interface ComparisonViewProps {
  readonly address: ProblemAddress;
  readonly comparison: EditionComparison;
}

/** All that moved: numbers, verdicts and trials first, then the words. */
export function ComparisonView({ address, comparison }: ComparisonViewProps) {
  const { values, verdicts, trials, definitions, passages } = comparison;
  const tied = tiedSentence(comparison);
  const sentences = [...trials, ...definitions, ...(tied === null ? [] : [tied])];
  return (
    <>
      <section aria-labelledby="in-numbers">
        <h2 id="in-numbers" className="h2 mb-1">
          In numbers
        </h2>
        {values.length + verdicts.length + sentences.length === 0 ? (
          <p className="text-ink-2">No number, verdict, trial or definition moved.</p>
        ) : (
          <ul>
            {values.map((moved) => (
              <MovedValueLine key={moved.key} address={address} moved={moved} />
            ))}
            {verdicts.map((moved) => (
              <MovedVerdictLine key={moved.n} address={address} moved={moved} />
            ))}
            {sentences.map((sentence) => (
              <MovedSentence key={sentence} sentence={sentence} />
            ))}
          </ul>
        )}
      </section>
      <section aria-labelledby="in-words" className="mt-8">
        <h2 id="in-words" className="h2">
          In words
        </h2>
        {passages.length === 0 ? (
          <p className="mt-1 text-ink-2">The text is the same.</p>
        ) : (
          <PassageList passages={passages} />
        )}
      </section>
    </>
  );
}

/** "Nine numbers were tied, one is no longer in the report."; null when the same ones are tied. */
function tiedSentence({ newlyTied, noLongerTied }: EditionComparison): string | null {
  const parts = [
    ...(newlyTied > 0 ? [`${countInWords(newlyTied)} tied ${numbers(newlyTied)} came`] : []),
    ...(noLongerTied > 0 ? [`${countInWords(noLongerTied)} tied ${numbers(noLongerTied)} went`] : []),
  ];
  if (parts.length === 0) return null;
  const sentence = sayList(parts);
  return `${sentence.charAt(0).toUpperCase()}${sentence.slice(1)}.`;
}

function numbers(count: number): string {
  return count === 1 ? 'number' : 'numbers';
}
