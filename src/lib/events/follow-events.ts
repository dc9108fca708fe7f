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

function forgetStale(client: QueryClient, event: Extract<ServerEvent, { type: 'stale' }>): void {
  const { team, what } = event;
  if (what === 'team' || what === 'problems' || event.number === undefined) {
    const queryKey = what === 'team' ? queryKeys.team(team) : queryKeys.problems(team);
    void client.invalidateQueries({ queryKey, exact: true });
    return;
  }
  const address = { team, number: event.number };
  const queryKey = what === 'report' ? queryKeys.report(address) : queryKeys.problem(address);
  void client.invalidateQueries({ queryKey, exact: true });
  void client.invalidateQueries({ queryKey: queryKeys.problems(team), exact: true });
}
