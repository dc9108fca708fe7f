import { useMutation, useQueryClient } from '@tanstack/react-query';
import { answerLeak } from '#shared/contracts/leaks.ts';
import { call } from '#src/lib/api/call.ts';
import type { ProblemAddress } from '#src/lib/problem/problem-address.ts';
import { queryKeys } from '#src/lib/query-keys.ts';

/** Prepares an answer; an empty text takes it away. `after`: the moment of the answer that was seen. */
export function useAnswerLeak(address: ProblemAddress, leak: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: { readonly text: string; readonly after: string | null }) =>
      call(answerLeak, { params: { ...address, leak }, body }),
    onSettled: () => client.invalidateQueries({ queryKey: queryKeys.ofProblem(address, 'leaks') }),
  });
}
