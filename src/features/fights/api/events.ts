import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import {
  createEvent,
  listEvents,
  removeEvent,
  updateEvent,
  type KeptEvent,
} from '#shared/contracts/fights.ts';
import type { Event } from '#shared/talk/event.ts';
import { call } from '#src/lib/api/call.ts';
import { queryKeys } from '#src/lib/query-keys.ts';

export function eventsQuery(team: string) {
  return queryOptions({
    queryKey: queryKeys.ofTeam(team, 'events'),
    queryFn: ({ signal }) => call(listEvents, { params: { team }, signal }),
  });
}

/** Adds an event, or changes the one that is given. */
export function useKeepEvent(team: string, kept: KeptEvent | null) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: Event) =>
      kept
        ? call(updateEvent, { params: { team, id: kept.id }, ifMatch: kept.rowVersion, body })
        : call(createEvent, { params: { team }, body }),
    onSettled: () => client.invalidateQueries({ queryKey: queryKeys.team(team) }),
  });
}

export function useRemoveEvent(team: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ id, rowVersion }: KeptEvent) =>
      call(removeEvent, { params: { team, id }, ifMatch: rowVersion }),
    onSettled: () => client.invalidateQueries({ queryKey: queryKeys.team(team) }),
  });
}
