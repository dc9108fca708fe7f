import { useMutation, useQueryClient } from '@tanstack/react-query';
import { signIn } from '#src/lib/api/boot-endpoints.ts';
import { call } from '#src/lib/api/call.ts';
import { forgetCsrfToken } from '#src/lib/api/csrf.ts';
import { queryKeys } from '#src/lib/query-keys.ts';
import { keepSession } from '#src/lib/session/use-session.ts';

export interface Credentials {
  readonly email: string;
  readonly passphrase: string;
}

export function useStartSession() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: async (body: Credentials) => {
      // A token from before belongs to another session.
      forgetCsrfToken();
      const session = await call(signIn, { body, mayBeSignedOut: true });
      forgetCsrfToken();
      return session;
    },
    onSuccess: (session) => {
      keepSession(session);
      client.setQueryData(queryKeys.session, session);
    },
  });
}
