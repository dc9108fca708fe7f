import { useMemo } from 'react';
import { useEvidence } from '#src/lib/evidence/use-evidence.ts';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { cautionsFor } from './cautions-for.ts';

/** The usual cautions for what this problem seems to need, and whose word counts. */
export function Cautions() {
  const evidence = useEvidence();
  const { problem } = useProblem();
  const cards = useMemo(() => cautionsFor(problem.statement, evidence), [problem.statement, evidence]);
  if (cards.length === 0) return null;
  return (
    <section aria-label="Usual cautions" className="page-sheet mt-6 px-6 pt-5 pb-4 text-xs max-sm:px-4">
      <h2 className="h3">Usual cautions</h2>
      {cards.map(({ hazard, cautions }) => (
        <details key={hazard} className="border-t border-hair py-2">
          <summary className="cursor-pointer font-[550]">{hazard}</summary>
          <ul className="mt-1 text-ink-2">
            {cautions.map((caution) => (
              <li key={caution}>– {caution}</li>
            ))}
          </ul>
        </details>
      ))}
      <p className="mt-2 text-ink-2">
        Your laboratory’s rules and safety officer decide. Stop and ask if this card and they differ.
      </p>
    </section>
  );
}
