import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { getSetup, setUp } from '#shared/contracts/admin.ts';
import { acceptInvitation, askForReset, getInvitation, resetPassphrase } from '#shared/contracts/people.ts';
import type { Session } from '#shared/contracts/session.ts';
import { call } from '#src/lib/api/call.ts';
import { forgetCsrfToken } from '#src/lib/api/csrf.ts';
import { queryKeys } from '#src/lib/query-keys.ts';
import { keepSession } from '#src/lib/session/use-session.ts';

// What a link opens is asked for once: when it was used it is gone, and the page must not turn under the reader.
const ONCE = { retry: false, staleTime: Infinity, gcTime: 0, refetchOnWindowFocus: false } as const;

export function invitationQuery(token: string) {
  return queryOptions({
    ...ONCE,
    queryKey: queryKeys.link('invitation', token),
    queryFn: ({ signal }) => call(getInvitation, { params: { token }, signal }),
  });
}

export function setupQuery(token: string) {
  return queryOptions({
    ...ONCE,
    queryKey: queryKeys.link('setup', token),
    queryFn: ({ signal }) => call(getSetup, { params: { token }, signal }),
  });
}

export function useAskForReset() {
  return useMutation({ mutationFn: (email: string) => call(askForReset, { body: { email } }) });
}

export function useResetPassphrase(token: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (passphrase: string) => call(resetPassphrase, { params: { token }, body: { passphrase } }),
    onSuccess: () => {
      forgetCsrfToken();
      keepSession(null);
      client.setQueryData(queryKeys.session, null);
    },
  });
}

export function useJoin(token: string) {
  const begin = useBeginSession();
  return useMutation({
    mutationFn: (body: { name: string; passphrase: string }) =>
      call(acceptInvitation, { params: { token }, body, mayBeSignedOut: true }),
    onSuccess: ({ session }) => begin(session),
  });
}

export function useSetUp(token: string) {
  const begin = useBeginSession();
  return useMutation({
    mutationFn: (body: { name: string; email: string; passphrase: string }) =>
      call(setUp, { params: { token }, body, mayBeSignedOut: true }),
    onSuccess: begin,
  });
}

/** Whoever was signed in before is not any more: nothing of theirs is kept. */
function useBeginSession(): (session: Session) => void {
  const client = useQueryClient();
  return (session) => {
    forgetCsrfToken();
    client.removeQueries({ queryKey: ['team'] });
    keepSession(session);
    client.setQueryData(queryKeys.session, session);
  };
}
