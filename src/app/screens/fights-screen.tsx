import { useQuery } from '@tanstack/react-query';
import { FightsPage } from '#src/features/fights/routes/fights-page.tsx';
import { problemsQuery } from '#src/features/season/api/list-problems.ts';
import { useTeam } from '#src/lib/team/team-context.ts';
import { useTitle } from '#src/lib/use-title.ts';

/** Every fight and the events they are held by; problems are named by their titles. */
export function Component() {
  const { team } = useTeam();
  const { data: problems } = useQuery(problemsQuery(team.slug));
  useTitle('Fights and events', team.name);
  return <FightsPage problems={problems ?? []} />;
}
