import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { BodyOf } from '#shared/contracts/endpoint.ts';
import { freezeEdition } from '#shared/contracts/editions.ts';
import { call } from '#src/lib/api/call.ts';
import type { ProblemAddress } from '#src/lib/problem/problem-address.ts';
import { queryKeys } from '#src/lib/query-keys.ts';

/** Whether it went well or somebody was first: the list is asked for again, because it is another one now. */
export function useFreezeEdition(address: ProblemAddress) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: BodyOf<typeof freezeEdition>) => call(freezeEdition, { params: { ...address }, body }),
    onSettled: () => client.invalidateQueries({ queryKey: queryKeys.ofProblem(address, 'editions') }),
  });
}
