import { useMutation } from '@tanstack/react-query';
import { putPassphrase } from '#src/lib/api/boot-endpoints.ts';
import { call } from '#src/lib/api/call.ts';
import { forgetCsrfToken } from '#src/lib/api/csrf.ts';

export function useChangePassphrase() {
  return useMutation({
    mutationFn: (body: { current: string; next: string }) => call(putPassphrase, { body }),
    onSuccess: forgetCsrfToken,
  });
}
