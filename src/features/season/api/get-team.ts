import { queryOptions } from '@tanstack/react-query';
import { getTeam } from '#shared/contracts/teams.ts';
import { call } from '#src/lib/api/call.ts';
import { queryKeys } from '#src/lib/query-keys.ts';

export function teamQuery(team: string) {
  return queryOptions({
    queryKey: queryKeys.team(team),
    queryFn: ({ signal }) => call(getTeam, { params: { team }, signal }),
  });
}
