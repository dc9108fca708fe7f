import { useState } from 'react';
import { SentenceText } from '#src/components/sentence-text.tsx';
import { VerdictMark } from '#src/components/verdict.tsx';
import { Word, WordLink } from '#src/components/word.tsx';
import { useFindingsSnapshot } from '#src/lib/evidence/use-evidence.ts';
import { paths } from '#src/lib/paths.ts';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { ClaimForm } from './claim-form.tsx';

/** The claims below the comparison: sentence, by what measure, verdict. */
export function ClaimList() {
  const { evidence, findings } = useFindingsSnapshot();
  const { address, mayWrite } = useProblem();
  const [isAdding, setIsAdding] = useState(false);
  return (
    <section className="page-sheet px-7 py-2 max-sm:px-4" aria-label="Claims">
      <h2 className="sr-only">Claims</h2>
      <ul>
        {evidence.claims.map((claim) => {
          const finding = findings.claims.get(claim.id);
          return (
            <li
              key={claim.id}
              className="grid grid-cols-[34px_1fr_190px_108px] items-center gap-3.5 border-t border-hair py-[11px] first:border-t-0 max-sm:grid-cols-[24px_1fr]"
            >
              <span className="font-report text-lg text-ink-3">{claim.n}</span>
              <span className="font-report text-[17px]/6 font-medium">{claim.text}</span>
              <span className="text-xs text-ink-2 max-sm:col-start-2">
                {finding && <SentenceText text={finding.short} />}
              </span>
              <span className="max-sm:col-start-2">
                {finding && <VerdictMark verdict={finding.verdict} />}
              </span>
            </li>
          );
        })}
        {evidence.claims.length === 0 && (
          <li className="grid grid-cols-[34px_1fr] gap-3.5 py-[11px] font-report text-[17px]/6 text-ink-3">
            <span className="text-lg">1</span>
            <i>a sentence you would defend, and the quantity it is about</i>
          </li>
        )}
      </ul>
      {isAdding && <ClaimForm id={null} onClose={() => setIsAdding(false)} />}
      <p className="flex gap-4.5 border-t border-hair py-3 text-sm">
        {mayWrite && !isAdding && <Word onClick={() => setIsAdding(true)}>New claim</Word>}
        {evidence.claims.length > 0 && <WordLink to={paths.claims(address)}>Claim sheet</WordLink>}
      </p>
    </section>
  );
}
