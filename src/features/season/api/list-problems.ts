import { queryOptions } from '@tanstack/react-query';
import { listProblems } from '#shared/contracts/teams.ts';
import { call } from '#src/lib/api/call.ts';
import { queryKeys } from '#src/lib/query-keys.ts';

export function problemsQuery(team: string) {
  return queryOptions({
    queryKey: queryKeys.problems(team),
    // Levels and verdicts follow every trial, so what is shown again is asked for again.
    staleTime: 0,
    queryFn: ({ signal }) => call(listProblems, { params: { team }, signal }),
  });
}
