import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { enterRoom, getRoom } from '#shared/contracts/copy-questions.ts';
import { call } from '#src/lib/api/call.ts';
import { copyKeys } from './keys.ts';

export const roomQuery = (token: string) =>
  queryOptions({
    queryKey: copyKeys.room(token),
    queryFn: ({ signal }) => call(getRoom, { params: { token }, signal, mayBeSignedOut: true }),
    retry: false,
  });

/** Sets the key of the room, or shows it. */
export function useEnterRoom(token: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (key: string) => call(enterRoom, { params: { token }, body: { key }, mayBeSignedOut: true }),
    onSuccess: () =>
      Promise.all([
        client.invalidateQueries({ queryKey: copyKeys.room(token) }),
        client.invalidateQueries({ queryKey: copyKeys.questions(token) }),
      ]),
  });
}
