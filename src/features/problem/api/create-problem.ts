import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { BodyOf } from '#shared/contracts/endpoint.ts';
import { createProblem } from '#shared/contracts/teams.ts';
import { call } from '#src/lib/api/call.ts';
import { queryKeys } from '#src/lib/query-keys.ts';

export type NewProblem = BodyOf<typeof createProblem>;

export function useCreateProblem(team: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: NewProblem) => call(createProblem, { params: { team }, body }),
    onSuccess: () => client.invalidateQueries({ queryKey: queryKeys.problems(team) }),
  });
}
