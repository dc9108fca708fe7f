import { afterEach, beforeEach, expect, test, vi } from 'vitest';
import type { ServerEvent } from '#shared/contracts/evidence-changes.ts';
import { createEventStream, type EventStream } from '#src/lib/events/event-stream.ts';
import { fakeServer, type FakeServer } from '../support/fake-server.ts';

const STALE: ServerEvent = { type: 'stale', what: 'problems', team: 'tern-rock' };
const WATCH = { type: 'watch', team: 'tern-rock', number: 1, where: 'Trials' } as const;

let server: FakeServer;
let stream: EventStream;
const checkSession = vi.fn(() => Promise.resolve());

beforeEach(() => {
  vi.useFakeTimers();
  server = fakeServer();
  stream = createEventStream({ address: 'ws://here/events', checkSession });
  stream.open();
});

afterEach(() => {
  stream.close();
  vi.useRealTimers();
  vi.unstubAllGlobals();
  checkSession.mockClear();
});

function socket(index: number) {
  const found = server.sockets[index];
  if (!found) throw new Error(`no socket ${index} was opened`);
  return found;
}

test('event stream, when the server says something: every listener hears it', () => {
  const heard = vi.fn();
  stream.onEvent(heard);

  socket(0).opens();
  socket(0).says(STALE);

  expect(heard).toHaveBeenCalledExactlyOnceWith(STALE);
  expect(stream.state.get()).toBe('open');
});

test('event stream, when what comes cannot be read: nothing breaks', () => {
  const heard = vi.fn();
  stream.onEvent(heard);

  socket(0).opens();
  socket(0).dispatchEvent(new MessageEvent('message', { data: '{half' }));

  expect(heard).not.toHaveBeenCalled();
});

test('event stream, when the connection is lost: says so, tries again, and tells again what is open', async () => {
  const returned = vi.fn();
  stream.onReturn(returned);
  socket(0).opens();
  stream.say(WATCH);

  socket(0).breaks();
  expect(stream.state.get()).toBe('down');
  await vi.advanceTimersByTimeAsync(600);
  socket(1).opens();

  expect(stream.state.get()).toBe('open');
  expect(socket(1).sent).toEqual([WATCH]);
  expect(returned).toHaveBeenCalledTimes(1);
  expect(checkSession).toHaveBeenCalledTimes(1);
});

test('event stream, when it is refused again and again: waits longer each time', async () => {
  socket(0).breaks();
  await vi.advanceTimersByTimeAsync(500);
  socket(1).breaks();
  await vi.advanceTimersByTimeAsync(900);
  expect(server.sockets).toHaveLength(2);
  await vi.advanceTimersByTimeAsync(200);

  expect(server.sockets).toHaveLength(3);
});

test('event stream, when it is closed: does not come back', async () => {
  socket(0).opens();

  stream.close();
  socket(0).breaks();
  await vi.advanceTimersByTimeAsync(60_000);

  expect(server.sockets).toHaveLength(1);
});
