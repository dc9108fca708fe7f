import { queryOptions } from '@tanstack/react-query';
import { getProblem } from '#shared/contracts/teams.ts';
import { call } from '#src/lib/api/call.ts';
import type { ProblemAddress } from '#src/lib/problem/problem-address.ts';
import { queryKeys } from '#src/lib/query-keys.ts';

export function problemQuery(address: ProblemAddress) {
  return queryOptions({
    queryKey: queryKeys.problem(address),
    queryFn: ({ signal }) => call(getProblem, { params: { ...address }, signal }),
  });
}
