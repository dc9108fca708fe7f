import { useQuery } from '@tanstack/react-query';
import { PeoplePage } from '#src/features/people/routes/people-page.tsx';
import { problemsQuery } from '#src/features/season/api/list-problems.ts';
import { useTeam } from '#src/lib/team/team-context.ts';

/** Who is in the team; what they work on is named by the problems' titles. */
export function Component() {
  const { team } = useTeam();
  const { data: problems } = useQuery(problemsQuery(team.slug));
  return <PeoplePage problems={problems ?? []} />;
}
