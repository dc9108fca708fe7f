import { queryOptions } from '@tanstack/react-query';
import { compareEditions } from '#shared/contracts/editions.ts';
import { call } from '#src/lib/api/call.ts';
import type { ProblemAddress } from '#src/lib/problem/problem-address.ts';
import { queryKeys } from '#src/lib/query-keys.ts';

/**
 * What moved from an edition to another one, or to the draft as it stands now.
 *
 * @param version - of the evidence: the draft is another one with each step
 */
export function comparisonQuery(
  address: ProblemAddress,
  n: number,
  other: number | 'draft',
  version: number,
) {
  const isOld = other === 'draft';
  return queryOptions({
    queryKey: [
      ...queryKeys.ofProblem(address, 'editions'),
      'compare',
      n,
      other,
      ...(isOld ? [version] : []),
    ] as const,
    queryFn: ({ signal }) => call(compareEditions, { params: { ...address, n, other }, signal }),
    // Two editions never change; of the draft's text no event tells.
    staleTime: isOld ? 0 : Infinity,
    placeholderData: (before) => before,
  });
}
