import { queryOptions } from '@tanstack/react-query';
import { listProblemCopies, listTeamCopies } from '#shared/contracts/copies.ts';
import { call } from '#src/lib/api/call.ts';
import type { ProblemAddress } from '#src/lib/problem/problem-address.ts';
import { queryKeys } from '#src/lib/query-keys.ts';

/** All that a team has lent, and all that is lent to it. */
export function teamCopiesQuery(team: string) {
  return queryOptions({
    queryKey: queryKeys.ofTeam(team, 'copies'),
    queryFn: ({ signal }) => call(listTeamCopies, { params: { team }, signal }),
  });
}

/** Copies of one problem's editions; they become old with those of the team. */
export function problemCopiesQuery(address: ProblemAddress) {
  return queryOptions({
    queryKey: [...queryKeys.ofTeam(address.team, 'copies'), address.number],
    queryFn: ({ signal }) => call(listProblemCopies, { params: { ...address }, signal }),
  });
}
