import type { QueryClient } from '@tanstack/react-query';
import type { ServerEvent } from '#shared/contracts/evidence-changes.ts';
import { takeStep } from '#src/lib/evidence/evidence-query.ts';
import { queryKeys } from '#src/lib/query-keys.ts';
import { createStore } from '#src/lib/store/create-store.ts';
import type { EventStream } from './event-stream.ts';

export type HereEvent = Extract<ServerEvent, { type: 'here' }>;
export type EvidenceEvent = Extract<ServerEvent, { type: 'evidence' }>;

/** Who has the open problem open, and in which place. */
export const here = createStore<HereEvent | null>(null);

/** Keeps the query cache in step with the server for as long as the stream is open. */
export function followEvents(stream: EventStream, client: QueryClient): () => void {
  const stopEvents = stream.onEvent((event) => {
    if (event.type === 'evidence') takeStep(client, event, event.step);
    else if (event.type === 'here') here.set(event);
    else forgetStale(client, event);
  });
  const stopReturns = stream.onReturn(() => {
    void client.invalidateQueries({ queryKey: ['team'] });
  });
  return () => {
    stopEvents();
    stopReturns();
    here.set(null);
  };
}

/** Screens of the season count what each problem has, so that they ask again too. */
function forgetStale(client: QueryClient, event: Extract<ServerEvent, { type: 'stale' }>): void {
  const { team, what, number } = event;
  const forget = (queryKey: readonly unknown[], exact = true) =>
    void client.invalidateQueries({ queryKey, exact });
  if (what === 'team') {
    forget(queryKeys.team(team));
    forget(queryKeys.ofTeam(team, 'fights'));
    forget(queryKeys.ofTeam(team, 'events'));
  } else if (number === undefined) forget(queryKeys.ofTeam(team, what), what === 'problems');
  else {
    const address = { team, number };
    if (what === 'problem') forget(queryKeys.problem(address));
    else forget(queryKeys.ofProblem(address, what), false);
    forget(queryKeys.problems(team));
  }
}
