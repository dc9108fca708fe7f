import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { z } from 'zod';
import { changeCopy, lendCopy, type lendSchema } from '#shared/contracts/copies.ts';
import { call } from '#src/lib/api/call.ts';
import { queryKeys } from '#src/lib/query-keys.ts';

/** Lends an edition of one of the team's problems; the answer tells the token, this once. */
export function useLendCopy(team: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({
      number,
      n,
      wanted,
    }: {
      readonly number: number;
      readonly n: number;
      readonly wanted: z.infer<typeof lendSchema>;
    }) => call(lendCopy, { params: { team, number, n }, body: wanted }),
    onSuccess: () => client.invalidateQueries({ queryKey: queryKeys.ofTeam(team, 'copies') }),
  });
}

/** Takes a copy back, or changes until when it is open. */
export function useChangeCopy(team: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({
      number,
      id,
      ...change
    }: {
      readonly number: number;
      readonly id: string;
      readonly until?: string;
      readonly takenBack?: true;
    }) => call(changeCopy, { params: { team, number, copy: id }, body: change }),
    onSuccess: () => client.invalidateQueries({ queryKey: queryKeys.ofTeam(team, 'copies') }),
  });
}
