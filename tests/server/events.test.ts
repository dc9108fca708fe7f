import { afterEach, beforeEach, expect, test } from 'vitest';
import { startTestServer } from '#tests/support/server.ts';
import type { SignedIn, TestServer } from '#tests/support/server.ts';
import { makeSmallProblem, newMutation } from '#tests/support/small-problem.ts';
import type { SmallProblem } from '#tests/support/small-problem.ts';
import { openSocket } from '#tests/support/socket.ts';
import type { TestSocket } from '#tests/support/socket.ts';

let app: TestServer;
let kasimir: SignedIn;
let small: SmallProblem;
beforeEach(async () => {
  app = await startTestServer();
  kasimir = await app.signIn('kasimir');
  small = await makeSmallProblem(kasimir);
});
afterEach(() => app.stop());

const WATCH = { type: 'watch', team: 'tern-rock', number: 20, where: 'Trials' };

/** A socket that watches the problem; it has been told who is here. */
async function watching(person: SignedIn, where = 'Trials'): Promise<TestSocket> {
  const socket = await openSocket(app.url, '/events', person.cookie);
  socket.send({ ...WATCH, where });
  await socket.next(({ type }) => type === 'here');
  return socket;
}

const log = (id: string) =>
  kasimir.post(`${small.path}/series/${small.series}/trials`, {
    mutationId: newMutation(),
    trials: [
      {
        id,
        values: { [small.theta]: { text: '10', unit: '°' }, [small.range]: { text: '36.4', unit: 'cm' } },
      },
    ],
  });
const isStep = ({ type }: Record<string, unknown>) => type === 'evidence';

test('events, when a trial is logged: watchers are told the very step that was answered', async () => {
  const odile = await watching(await app.signIn('odile'));

  const answer = await log('t-1');

  expect(await odile.next(isStep)).toEqual({
    type: 'evidence',
    team: 'tern-rock',
    number: 20,
    step: answer.body,
  });
});

test('events, when many change at once: arrive in the order of their versions, each once', async () => {
  const odile = await watching(await app.signIn('odile'));

  const answers = await Promise.all(Array.from({ length: 20 }, (_, index) => log(`t-${index}`)));
  const last = Math.max(...answers.map(({ body }) => body.version));
  await odile.next((message) => isStep(message) && (message.step as { version: number }).version === last);

  const versions = odile.messages.filter(isStep).map(({ step }) => (step as { version: number }).version);
  expect(versions).toEqual(Array.from({ length: 20 }, (_, index) => last - 19 + index));
});

test('events, when a tab watches another problem: is not told of this one', async () => {
  const socket = await openSocket(app.url, '/events', kasimir.cookie);
  socket.send({ ...WATCH, number: 1 });
  await socket.next(({ type }) => type === 'here');

  await log('t-1');
  await socket.next(({ type, what }) => type === 'stale' && what === 'problems');

  expect(socket.messages.filter(isStep)).toEqual([]);
});

test('events, when a tab has left: is told no more steps', async () => {
  const socket = await watching(kasimir);
  socket.send({ type: 'leave' });
  socket.send({ ...WATCH, number: 1 });
  await socket.next(({ type, number }) => type === 'here' && number === 1);

  await log('t-1');
  await socket.next(({ type }) => type === 'stale');

  expect(socket.messages.filter(isStep)).toEqual([]);
});

test('events, when somebody of another team asks to watch: the socket is closed and nothing told', async () => {
  const sunniva = await app.signIn('sunniva');
  const socket = await openSocket(app.url, '/events', sunniva.cookie);

  socket.send(WATCH);

  expect(await socket.closed).toBe(4403);
  expect(socket.messages).toEqual([]);
});

test('events, when a tab says what nobody understands: the socket is closed', async () => {
  const socket = await openSocket(app.url, '/events', kasimir.cookie);

  socket.send('{"type":"shout"}');

  expect(await socket.closed).toBe(1007);
});

test('here, when two people have the problem open: each is told of the other and where, and of their going', async () => {
  const first = await watching(kasimir, 'Trials');
  const odile = await app.signIn('odile');

  const second = await watching(odile, 'Comparison');

  const [seenBySecond] = second.messages;
  expect(seenBySecond).toMatchObject({ people: [{ name: 'Kasimir Lund', where: 'Trials' }] });
  const isOdileHere = ({ people }: Record<string, unknown>) =>
    JSON.stringify(people) === JSON.stringify([{ name: 'Odile Marsk', where: 'Comparison' }]);
  await first.next(isOdileHere);
  second.close();
  await first.next((message) => {
    const at = first.messages.indexOf(message);
    return at > first.messages.findIndex(isOdileHere) && JSON.stringify(message.people) === '[]';
  });
});

test('here, when one person has two tabs: is named once', async () => {
  await watching(kasimir, 'Trials');
  await watching(kasimir, 'Report');

  const odile = await watching(await app.signIn('odile'));

  expect(odile.messages[0]).toMatchObject({ people: [{ name: 'Kasimir Lund', where: 'Report' }] });
});

test('sign out, when the session has a socket open: it is closed', async () => {
  const socket = await watching(kasimir);

  await kasimir.delete('/api/session');

  expect(await socket.closed).toBe(4401);
});

test('stop, when sockets are open: they are told that the server restarts', async () => {
  const socket = await watching(kasimir);

  await app.server.close();

  expect(await socket.closed).toBe(1001);
  app = await startTestServer();
});
