import { queryOptions } from '@tanstack/react-query';
import { listNotes } from '#shared/contracts/notes.ts';
import { call } from '#src/lib/api/call.ts';
import type { ProblemAddress } from '#src/lib/problem/problem-address.ts';
import { queryKeys } from '#src/lib/query-keys.ts';

/** The notes beside a report, by number. */
export function notesQuery(address: ProblemAddress) {
  return queryOptions({
    queryKey: queryKeys.ofProblem(address, 'notes'),
    queryFn: ({ signal }) => call(listNotes, { params: { ...address }, signal }),
  });
}
