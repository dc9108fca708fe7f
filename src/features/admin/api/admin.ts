import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import * as contracts from '#shared/contracts/admin.ts';
import type { BodyOf } from '#shared/contracts/endpoint.ts';
import { call } from '#src/lib/api/call.ts';
import { queryKeys } from '#src/lib/query-keys.ts';

export const allTeamsQuery = queryOptions({
  queryKey: queryKeys.admin('teams'),
  queryFn: ({ signal }) => call(contracts.listAllTeams, { signal }),
});

export const allPeopleQuery = queryOptions({
  queryKey: queryKeys.admin('people'),
  queryFn: ({ signal }) => call(contracts.listAllPeople, { signal }),
});

export function useAdminActions() {
  const client = useQueryClient();
  const old = () => client.invalidateQueries({ queryKey: queryKeys.admin() });
  return {
    createTeam: useMutation({
      mutationFn: (body: BodyOf<typeof contracts.createTeam>) => call(contracts.createTeam, { body }),
      onSuccess: old,
    }),
    inviteCaptain: useMutation({
      mutationFn: ({ team, ...body }: { team: string; name: string; email: string }) =>
        call(contracts.inviteCaptain, { params: { team }, body }),
      onSuccess: old,
    }),
    changePerson: useMutation({
      mutationFn: ({ person, isDisabled }: { person: string; isDisabled: boolean }) =>
        call(contracts.changePerson, { params: { person }, body: { isDisabled } }),
      onSuccess: old,
    }),
  };
}
