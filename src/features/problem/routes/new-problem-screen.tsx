import { WordLink } from '#src/components/word.tsx';
import { paths } from '#src/lib/paths.ts';
import { useTeam } from '#src/lib/team/team-context.ts';
import { useTitle } from '#src/lib/use-title.ts';
import { NewProblemForm } from '../components/new-problem-form.tsx';

/** A problem begins with its task as it was set. */
export function Component() {
  const { team, role } = useTeam();
  useTitle('New problem', team.name);
  return (
    <main id="page" tabIndex={-1} data-region="page" className="page-top mx-auto max-w-[760px] px-4.5 pb-24">
      <h1 className="h1">New problem</h1>
      {role === 'advisor' ? (
        <p className="mt-4 font-report text-report text-ink-2">
          You advise this team: the captain and the members begin a problem.{' '}
          <WordLink to={paths.season(team.slug)}>Go to the Season</WordLink>
        </p>
      ) : (
        <NewProblemForm team={team} />
      )}
    </main>
  );
}
