import { call } from '#src/lib/api/call.ts';
import { getSession } from '#src/lib/api/boot-endpoints.ts';
import { createEventStream, type EventStream } from './event-stream.ts';

let stream: EventStream | null = null;

/** The one event stream of this tab. */
export function eventStream(): EventStream {
  stream ??= createEventStream({
    address: `${location.protocol === 'https:' ? 'wss' : 'ws'}://${location.host}/events`,
    checkSession: async () => {
      await call(getSession, {});
    },
  });
  return stream;
}
