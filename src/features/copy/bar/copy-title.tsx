import type { CopyView } from '#shared/editions/copy-view.ts';
import { sayList } from '#src/lib/say/say-list.ts';

/** The head of a lent report: running line, the problem as it was set, and who answers it. */
export function CopyTitle({ view }: { readonly view: CopyView }) {
  const { problem, team, edition, authors, advisors } = view;
  return (
    <>
      <p className="report-running">
        <span>
          {problem.title} · {team.name} · edition {edition.n}
        </span>
      </p>
      <header className="report-title">
        <p className="text-sm text-ink-3">
          Problem {problem.number}
          {team.isDemo && ', invented for demonstration'}
        </p>
        <h1 className="h1">{problem.title}</h1>
        <p className="mt-2 font-report text-report text-ink-2">{problem.statement}</p>
        <p className="mt-3 text-sm text-ink-2">
          {sayList(authors)}
          {advisors.length > 0 && `; advised by ${sayList(advisors)}`}. {team.name}, {team.university}.
        </p>
      </header>
    </>
  );
}
