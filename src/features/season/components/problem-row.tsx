import { Link } from 'react-router-dom';
import type { ProblemSummary } from '#shared/contracts/teams.ts';
import { LevelGauge } from '#src/components/level-gauge.tsx';
import { VerdictCount } from '#src/components/verdict.tsx';
import { WordLink } from '#src/components/word.tsx';
import { paths } from '#src/lib/paths.ts';
import { lastName } from '#src/lib/say/last-name.ts';
import { useMedia } from '#src/lib/use-media.ts';
import { STAGE_WORDS } from '../sentences/stage-words.ts';
import { PROBLEM_GRID } from './problem-list.tsx';

interface ProblemRowProps {
  readonly team: string;
  readonly problem: ProblemSummary;
}

/** The whole row opens the problem; its settings stand at the end. */
export function ProblemRow({ team, problem }: ProblemRowProps) {
  const address = { team, number: problem.number };
  const isNarrow = useMedia('(max-width: 899.98px)');
  return (
    <li
      className={`relative border-hair max-sm:border-b max-sm:border-rule max-sm:px-4.5 max-sm:py-4 sm:min-h-[98px] sm:not-last:border-b max-md:!block max-md:py-4 ${PROBLEM_GRID}`}
    >
      <span className="font-report text-[24px]/[30px] text-ink-3 max-md:float-left max-md:min-w-9 max-md:text-[20px]/[27px] md:self-start md:pt-[17px]">
        {problem.number}
      </span>
      <div className="md:py-4 md:pr-3">
        <Link
          to={paths.problem(address)}
          className="mr-2.5 font-report text-[21px]/7 font-medium after:absolute after:inset-0"
        >
          {problem.title}
        </Link>
        {problem.stage && (
          <span className="font-report text-[17px]/7 text-ink-2 italic">{STAGE_WORDS[problem.stage]}</span>
        )}
        <p className="mt-px line-clamp-2 max-w-[352px] text-sm text-pretty text-ink-2 max-md:hidden">
          {problem.statement}
        </p>
      </div>
      <span className="text-sm text-ink-2 max-md:hidden">
        {problem.owners.map(({ id, name }, index) => (
          <span key={id} className="block">
            {lastName(name)}
            {index < problem.owners.length - 1 && ','}
          </span>
        ))}
      </span>
      <div className="max-md:clear-left max-md:mt-2.5">
        <LevelGauge levels={problem.levels} named={isNarrow} />
      </div>
      <div className="max-md:mt-3">
        <VerdictCount {...problem.claims} />
      </div>
      <WordLink
        to={paths.settings(address)}
        aria-label={`Settings of ${problem.title}`}
        className="relative z-1 justify-self-end text-xs max-md:absolute max-md:right-4.5 max-md:bottom-4"
      >
        Settings
      </WordLink>
    </li>
  );
}
