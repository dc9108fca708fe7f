import { useQuery, useQueryClient } from '@tanstack/react-query';
import { Suspense, useEffect, useMemo, useSyncExternalStore } from 'react';
import { Outlet, useLocation } from 'react-router-dom';
import { Loading } from '#src/components/loading.tsx';
import { problemQuery } from '#src/features/problem/api/get-problem.ts';
import { eventStream } from '#src/lib/events/stream.ts';
import { evidenceQuery } from '#src/lib/evidence/evidence-query.ts';
import { keepLastStation } from '#src/lib/preferences/last-station.ts';
import type { ProblemAddress } from '#src/lib/problem/problem-address.ts';
import { ProblemContext, type OpenProblem } from '#src/lib/problem/problem-context.ts';
import { useSession } from '#src/lib/session/use-session.ts';
import { nextFight } from '#src/lib/team/next-fight.ts';
import { useTeam } from '#src/lib/team/team-context.ts';
import { FailedScreen } from '../screens/failed-screen.tsx';
import { ProblemTopLine } from '../top-line/problem-top-line.tsx';
import { stationOf } from '../top-line/station-of.ts';
import { useFindingsOf } from './use-findings-of.ts';

/** Shows a problem's screens once the problem, its evidence and its first findings are there. */
export function LoadedProblem({ address }: { readonly address: ProblemAddress }) {
  const { team, role } = useTeam();
  const { user } = useSession();
  const problem = useQuery(problemQuery(address));
  const evidence = useQuery(evidenceQuery(useQueryClient(), address));
  const store = useFindingsOf(evidence.data);
  const snapshot = useSyncExternalStore(store.subscribe, store.get);
  const failure = useSyncExternalStore(store.subscribe, store.failure);
  useVisit(address);
  const open = useMemo((): OpenProblem | null => {
    if (!problem.data) return null;
    return {
      address,
      team,
      problem: problem.data,
      role,
      mayWrite: role !== 'advisor',
      me: user.name,
      nextFight: nextFight(team.fights, new Date()),
      store,
    };
  }, [address, team, role, user.name, problem.data, store]);

  if (open && snapshot) {
    return (
      <ProblemContext value={open}>
        <ProblemTopLine />
        <Suspense fallback={<Loading what="the page" />}>
          <Outlet />
        </Suspense>
      </ProblemContext>
    );
  }
  const error = problem.error ?? evidence.error ?? failure;
  if (error === null) return <Loading what="the problem" />;
  const again = () => {
    void problem.refetch();
    void evidence.refetch().then(({ data }) => data && store.feed(data));
  };
  return <FailedScreen error={error} onAgain={again} />;
}

/** Remembers the station, and tells the others when this person leaves the problem. */
function useVisit(address: ProblemAddress): void {
  const station = stationOf(useLocation().pathname);
  useEffect(() => {
    if (station) keepLastStation(address, station);
  }, [address, station]);
  useEffect(() => () => eventStream().say({ type: 'leave' }), [address]);
}
