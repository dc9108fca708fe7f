import { useMutation, useQueryClient } from '@tanstack/react-query';
import { passCopy } from '#shared/contracts/copies.ts';
import { call } from '#src/lib/api/call.ts';
import { copyKeys } from './keys.ts';

/** Answers the passphrase of a copy, which then opens. */
export function usePassCopy(token: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (passphrase: string) =>
      call(passCopy, { params: { token }, body: { passphrase }, mayBeSignedOut: true }),
    onSuccess: () => client.invalidateQueries({ queryKey: copyKeys.copy(token) }),
  });
}
