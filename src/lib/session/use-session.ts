import { queryOptions } from '@tanstack/react-query';
import { createContext, useContext } from 'react';
import type { Role, Session } from '#shared/contracts/session.ts';
import { ApiError } from '#src/lib/api/api-error.ts';
import { getSession } from '#src/lib/api/boot-endpoints.ts';
import { call } from '#src/lib/api/call.ts';
import { queryKeys } from '#src/lib/query-keys.ts';
import { rememberSession } from './sign-in-again.ts';

/** Who is signed in; null when nobody is. */
export const sessionQuery = queryOptions({
  queryKey: queryKeys.session,
  staleTime: 5 * 60_000,
  queryFn: async ({ signal }): Promise<Session | null> => {
    try {
      const session = await call(getSession, { signal, mayBeSignedOut: true });
      keepSession(session);
      return session;
    } catch (error) {
      if (error instanceof ApiError && error.status === 401) return null;
      throw error;
    }
  },
});

export function keepSession(session: Session | null): void {
  rememberSession(session && { userId: session.user.id, email: session.user.email, name: session.user.name });
}

/** The session of everything that is shown only to who is signed in. */
export const SessionContext = createContext<Session | null>(null);

export function useSession(): Session {
  const session = useContext(SessionContext);
  if (!session) throw new Error('useSession: needs to stand inside the frame of who is signed in');
  return session;
}

export function roleIn(session: Session, team: string): Role | null {
  return session.teams.find(({ slug }) => slug === team)?.role ?? null;
}
