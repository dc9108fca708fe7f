import { sayList } from '#src/lib/say/say-list.ts';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { ExportWord } from './export-word.tsx';

/** The unnumbered head of the report: the problem as it was set, and who answers it. */
export function TitleBlock() {
  const { problem, team } = useProblem();
  const authors =
    problem.owners.length > 0 ? problem.owners : team.people.filter(({ role }) => role !== 'advisor');
  const advisors = team.people.filter(({ role }) => role === 'advisor');
  return (
    <header className="report-title">
      <p className="font-report text-[16px]/6 text-ink-3">
        Problem {problem.number}
        {team.isDemo && ', invented for demonstration'}
      </p>
      <h1 className="h1 text-[38px]/11 max-sm:text-[32px]/9">{problem.title}</h1>
      <p className="mt-2 font-report text-report text-ink-2 italic">{problem.statement}</p>
      <p className="mt-3.5 text-sm text-ink-2">
        {sayList(authors.map(({ name }) => name))}
        {advisors.length > 0 && `; advised by ${sayList(advisors.map(({ name }) => name))}`}. {team.name},{' '}
        {team.university}.
      </p>
      <p className="mt-3 border-b border-ink-3 pb-5 text-sm">
        <ExportWord />
      </p>
    </header>
  );
}
