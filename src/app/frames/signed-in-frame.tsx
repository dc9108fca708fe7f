import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useEffect } from 'react';
import { Navigate, Outlet, useLocation } from 'react-router-dom';
import { Loading } from '#src/components/loading.tsx';
import { followEvents } from '#src/lib/events/follow-events.ts';
import { eventStream } from '#src/lib/events/stream.ts';
import { paths } from '#src/lib/paths.ts';
import { SessionContext, sessionQuery } from '#src/lib/session/use-session.ts';
import { FailedScreen } from '../screens/failed-screen.tsx';

/** Lets in who is signed in, and hears the server's events for as long as they are. */
export function Component() {
  const { data: session, error, refetch } = useQuery(sessionQuery);
  const { pathname, search, hash } = useLocation();
  useEventStream(session?.user.id ?? null);
  if (session) {
    return (
      <SessionContext value={session}>
        <Outlet />
      </SessionContext>
    );
  }
  if (error) return <FailedScreen error={error} onAgain={() => void refetch()} />;
  if (session === null) return <Navigate replace to={paths.signIn(pathname + search + hash)} />;
  return <Loading what="your teams" />;
}

function useEventStream(userId: string | null): void {
  const client = useQueryClient();
  useEffect(() => {
    if (userId === null) return;
    const stream = eventStream();
    const stopFollowing = followEvents(stream, client);
    stream.open();
    return () => {
      stopFollowing();
      stream.close();
    };
  }, [userId, client]);
}
