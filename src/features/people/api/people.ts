import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import * as contracts from '#shared/contracts/people.ts';
import type { Role } from '#shared/contracts/session.ts';
import { changeRole } from '#shared/contracts/teams.ts';
import { call } from '#src/lib/api/call.ts';
import { queryKeys } from '#src/lib/query-keys.ts';

export function invitationsQuery(team: string) {
  return queryOptions({
    queryKey: queryKeys.ofTeam(team, 'invitations'),
    queryFn: ({ signal }) => call(contracts.listInvitations, { params: { team }, signal }),
  });
}

export function outboxQuery(team: string) {
  return queryOptions({
    queryKey: queryKeys.ofTeam(team, 'outbox'),
    queryFn: ({ signal }) => call(contracts.listOutbox, { params: { team }, signal }),
  });
}

/** What the captain does with people and mail; what it changes is asked for again. */
export function usePeopleActions(team: string) {
  const client = useQueryClient();
  const old = () =>
    Promise.all([
      client.invalidateQueries({ queryKey: queryKeys.team(team), exact: true }),
      client.invalidateQueries({ queryKey: queryKeys.ofTeam(team, 'invitations') }),
      client.invalidateQueries({ queryKey: queryKeys.ofTeam(team, 'outbox') }),
    ]);
  return {
    invite: useMutation({
      mutationFn: (body: { name: string; email: string; role: Role }) =>
        call(contracts.invite, { params: { team }, body }),
      onSuccess: old,
    }),
    withdraw: useMutation({
      mutationFn: (invitation: string) =>
        call(contracts.withdrawInvitation, { params: { team, invitation } }),
      onSettled: old,
    }),
    retry: useMutation({
      mutationFn: (mail: string) => call(contracts.retryMail, { params: { team, mail } }),
      onSettled: old,
    }),
    changeRole: useMutation({
      mutationFn: ({ person, role }: { person: string; role: Role }) =>
        call(changeRole, { params: { team, person }, body: { role } }),
      onSettled: () => Promise.all([old(), client.invalidateQueries({ queryKey: queryKeys.session })]),
    }),
    remove: useMutation({
      mutationFn: (person: string) => call(contracts.removeMember, { params: { team, person } }),
      onSuccess: old,
    }),
  };
}
