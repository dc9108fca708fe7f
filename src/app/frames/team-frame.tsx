import { useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import { Outlet, useParams } from 'react-router-dom';
import { Loading } from '#src/components/loading.tsx';
import { teamQuery } from '#src/features/season/api/get-team.ts';
import { roleIn, useSession } from '#src/lib/session/use-session.ts';
import { TeamContext } from '#src/lib/team/team-context.ts';
import { FailedScreen } from '../screens/failed-screen.tsx';

/** Loads the team that the address names. */
export function Component() {
  const { team: slug = '' } = useParams();
  const role = roleIn(useSession(), slug);
  const { data: team, error, refetch } = useQuery(teamQuery(slug));
  const open = useMemo(() => (team && role ? { team, role } : null), [team, role]);
  if (open) {
    return (
      <TeamContext value={open}>
        <Outlet />
      </TeamContext>
    );
  }
  if (error) return <FailedScreen error={error} onAgain={() => void refetch()} />;
  return <Loading what="the team" />;
}
