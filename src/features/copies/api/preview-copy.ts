import { queryOptions } from '@tanstack/react-query';
import { previewCopy } from '#shared/contracts/copies.ts';
import { call } from '#src/lib/api/call.ts';
import type { ProblemAddress } from '#src/lib/problem/problem-address.ts';
import { queryKeys } from '#src/lib/query-keys.ts';

/** What the reader of a copy sees, for the captain. */
export function previewQuery(address: ProblemAddress, copy: string) {
  return queryOptions({
    queryKey: [...queryKeys.ofTeam(address.team, 'copies'), address.number, copy],
    queryFn: ({ signal }) => call(previewCopy, { params: { ...address, copy }, signal }),
    staleTime: Infinity,
  });
}
