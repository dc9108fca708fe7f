import { queryOptions } from '@tanstack/react-query';
import { listEditions } from '#shared/contracts/editions.ts';
import { call } from '#src/lib/api/call.ts';
import type { ProblemAddress } from '#src/lib/problem/problem-address.ts';
import { queryKeys } from '#src/lib/query-keys.ts';

/** Editions that may be lent. */
export function lendableQuery(address: ProblemAddress) {
  return queryOptions({
    queryKey: queryKeys.ofProblem(address, 'editions'),
    queryFn: ({ signal }) => call(listEditions, { params: { ...address }, signal }),
  });
}
