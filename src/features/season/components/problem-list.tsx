import type { ProblemSummary } from '#shared/contracts/teams.ts';
import { sectionNameSchema } from '#shared/contracts/teams.ts';
import { ProblemRow } from './problem-row.tsx';

interface ProblemListProps {
  readonly team: string;
  readonly problems: readonly ProblemSummary[];
}

export const PROBLEM_GRID =
  'md:grid md:grid-cols-[44px_minmax(0,1fr)_76px_minmax(300px,440px)_118px_64px] md:items-center md:gap-x-3.5';

/** Problems by number: how far each section has come, and what its claims hold. */
export function ProblemList({ team, problems }: ProblemListProps) {
  return (
    <section aria-label="Problems" className="page-sheet max-sm:-mx-4.5 sm:px-[34px] sm:pb-2">
      <div
        aria-hidden="true"
        className={`h-[46px] border-b-[1.25px] border-ink text-xs text-ink-2 max-md:hidden ${PROBLEM_GRID}`}
      >
        <span />
        <span>Problem</span>
        <span>Owners</span>
        <span className="grid grid-cols-5">
          {sectionNameSchema.options.map((section) => (
            <span key={section}>{section}</span>
          ))}
        </span>
        <span>Claims</span>
        <span />
      </div>
      <ul>
        {problems.map((problem) => (
          <ProblemRow key={problem.number} team={team} problem={problem} />
        ))}
      </ul>
    </section>
  );
}
