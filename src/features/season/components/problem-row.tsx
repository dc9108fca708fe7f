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
      className={`relative border-hair max-md:flex max-md:flex-wrap max-md:items-baseline max-md:gap-x-2.5 max-md:py-4 max-sm:border-b max-sm:border-rule max-sm:pr-3.5 max-sm:pl-4.5 sm:not-last:border-b md:min-h-[98px] ${PROBLEM_GRID}`}
    >
      <span className="font-report text-[24px]/[30px] text-ink-3 max-md:min-w-4 max-md:text-[20px]/[27px] md:self-start md:pt-[17px]">
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
          <span className="font-report text-[17px]/7 whitespace-nowrap text-ink-2 italic max-sm:text-[16px]">
            {STAGE_WORDS[problem.stage]}
          </span>
        )}
        <p className="mt-px line-clamp-3 max-w-[352px] text-sm text-pretty text-ink-2 max-md:hidden">
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
      <div className="max-md:order-last max-md:mt-2.5 max-md:w-full">
        <LevelGauge levels={problem.levels} named={isNarrow} />
      </div>
      <div className="max-md:ml-auto">
        <VerdictCount {...problem.claims} />
      </div>
      <WordLink
        to={paths.settings(address)}
        aria-label={`Settings of ${problem.title}`}
        className="relative z-1 justify-self-end text-xs max-md:ml-3 max-sm:hidden"
      >
        Settings
      </WordLink>
    </li>
  );
}
