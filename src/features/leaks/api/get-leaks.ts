import { queryOptions } from '@tanstack/react-query';
import { getLeaks } from '#shared/contracts/leaks.ts';
import { call } from '#src/lib/api/call.ts';
import type { ProblemAddress } from '#src/lib/problem/problem-address.ts';
import { queryKeys } from '#src/lib/query-keys.ts';

/** What the team has answered, and what was found before. The leaks themselves are found in the browser. */
export function leaksQuery(address: ProblemAddress) {
  return queryOptions({
    queryKey: queryKeys.ofProblem(address, 'leaks'),
    queryFn: ({ signal }) => call(getLeaks, { params: { ...address }, signal }),
  });
}
