import { useQuery } from '@tanstack/react-query';
import { CopiesPage } from '#src/features/copies/routes/copies-page.tsx';
import { problemsQuery } from '#src/features/season/api/list-problems.ts';
import { useTeam } from '#src/lib/team/team-context.ts';

/** What is lent, and what may be. */
export function Component() {
  const { team } = useTeam();
  const { data: problems } = useQuery(problemsQuery(team.slug));
  return <CopiesPage problems={problems ?? []} />;
}
