import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import type { ProblemSummary } from '#shared/contracts/teams.ts';
import { Notice } from '#src/components/notice.tsx';
import { sentenceOf } from '#src/lib/api/api-error.ts';
import { useTeam } from '#src/lib/team/team-context.ts';
import { lendableQuery } from '../api/list-editions.ts';
import { LendDialog } from './lend-dialog.tsx';

type Named = Pick<ProblemSummary, 'number' | 'title'>;

/** The last row of what is out: the next copy. First the problem, then what a copy needs. */
export function LendEdition({ problems }: { readonly problems: readonly Named[] }) {
  const [chosen, setChosen] = useState<Named | null>(null);
  const [isOpen, setIsOpen] = useState(false);
  const pick = (problem: Named) => {
    setChosen(problem);
    setIsOpen(true);
  };
  return (
    <div className="py-3.5 pl-[92px] max-md:pl-0">
      <p className="font-report text-[17px]/6 text-ink-3 italic">
        Lend an edition: which, to whom, until when
      </p>
      <p className="mt-1 flex flex-wrap gap-x-4 gap-y-1 text-sm">
        {problems.map((problem) => (
          <button key={problem.number} type="button" className="word" onClick={() => pick(problem)}>
            Lend {problem.title}
          </button>
        ))}
      </p>
      {chosen && isOpen && <Chosen problem={chosen} onClose={() => setIsOpen(false)} />}
    </div>
  );
}

function Chosen({ problem, onClose }: { readonly problem: Named; readonly onClose: () => void }) {
  const { team } = useTeam();
  const address = { team: team.slug, number: problem.number };
  const { data, error } = useQuery(lendableQuery(address));
  if (error) return <Notice title={sentenceOf(error)} className="mt-3" />;
  if (!data) return null;
  if (data.length === 0) {
    return (
      <p role="status" className="mt-2 text-sm text-ink-2">
        {problem.title} has no edition yet. Freeze one in its Editions first.
      </p>
    );
  }
  return (
    <LendDialog address={address} title={problem.title} editions={data.map(({ n }) => n)} onClose={onClose} />
  );
}
