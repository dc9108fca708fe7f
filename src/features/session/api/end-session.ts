import { useMutation, useQueryClient } from '@tanstack/react-query';
import { signOut } from '#src/lib/api/boot-endpoints.ts';
import { call } from '#src/lib/api/call.ts';
import { forgetCsrfToken } from '#src/lib/api/csrf.ts';
import { queryKeys } from '#src/lib/query-keys.ts';
import { keepSession } from '#src/lib/session/use-session.ts';

/** Signs out and forgets everything that was brought for this person. */
export function useEndSession() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => call(signOut, { mayBeSignedOut: true }),
    onSuccess: () => {
      forgetCsrfToken();
      keepSession(null);
      client.removeQueries({ predicate: ({ queryKey }) => queryKey[0] !== queryKeys.session[0] });
      client.setQueryData(queryKeys.session, null);
    },
  });
}
