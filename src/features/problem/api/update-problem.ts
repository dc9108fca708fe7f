import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { BodyOf } from '#shared/contracts/endpoint.ts';
import { updateProblem } from '#shared/contracts/teams.ts';
import { call } from '#src/lib/api/call.ts';
import type { ProblemAddress } from '#src/lib/problem/problem-address.ts';
import { queryKeys } from '#src/lib/query-keys.ts';

export type ProblemChange = BodyOf<typeof updateProblem>;

export function useUpdateProblem(address: ProblemAddress, rowVersion: number) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: ProblemChange) =>
      call(updateProblem, { params: { ...address }, body, ifMatch: rowVersion }),
    onSuccess: (problem) => {
      client.setQueryData(queryKeys.problem(address), problem);
      void client.invalidateQueries({ queryKey: queryKeys.problems(address.team) });
      // Settings are evidence: its version has grown.
      void client.invalidateQueries({ queryKey: queryKeys.evidence(address) });
    },
  });
}
