import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import {
  createFight,
  listFights,
  removeFight,
  updateFight,
  type FightInput,
  type KeptFight,
} from '#shared/contracts/fights.ts';
import { call } from '#src/lib/api/call.ts';
import { queryKeys } from '#src/lib/query-keys.ts';

/** Under the team's key: what tells that the team changed tells of its fights too. */
export function fightsQuery(team: string) {
  return queryOptions({
    queryKey: queryKeys.ofTeam(team, 'fights'),
    queryFn: ({ signal }) => call(listFights, { params: { team }, signal }),
  });
}

/** Adds a fight, or changes the one that is given. */
export function useKeepFight(team: string, kept: KeptFight | null) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: FightInput) =>
      kept
        ? call(updateFight, { params: { team, id: kept.id }, ifMatch: kept.rowVersion, body })
        : call(createFight, { params: { team }, body }),
    onSettled: () => client.invalidateQueries({ queryKey: queryKeys.team(team) }),
  });
}

export function useRemoveFight(team: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ id, rowVersion }: KeptFight) =>
      call(removeFight, { params: { team, id }, ifMatch: rowVersion }),
    onSettled: () => client.invalidateQueries({ queryKey: queryKeys.team(team) }),
  });
}
