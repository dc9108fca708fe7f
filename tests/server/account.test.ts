import { afterEach, beforeEach, expect, test } from 'vitest';
import { startTestServer } from '#tests/support/server.ts';
import type { TestServer } from '#tests/support/server.ts';
import { openSocket } from '#tests/support/socket.ts';

let app: TestServer;
beforeEach(async () => {
  app = await startTestServer();
});
afterEach(() => app.stop());

const CURRENT = 'brass ruler and level';
const NEXT = 'four quiet harbour seals';

test('change passphrase, when the current one fits: the new one signs in and the old one no more', async () => {
  const kasimir = await app.signIn('kasimir');

  const answer = await kasimir.put('/api/account/password', { current: CURRENT, next: NEXT });

  expect(answer.status).toBe(204);
  const email = 'kasimir.lund@skerry.example';
  const stranger = await app.stranger();
  expect((await stranger.post('/api/session', { email, passphrase: CURRENT })).status).toBe(401);
  expect((await stranger.post('/api/session', { email, passphrase: NEXT })).status).toBe(200);
});

test('change passphrase, when the person is signed in elsewhere: those sessions and sockets end, this one stays', async () => {
  const here = await app.signIn('kasimir');
  const elsewhere = await app.signIn('kasimir');
  const hereSocket = await openSocket(app.url, '/events', here.cookie);
  const elsewhereSocket = await openSocket(app.url, '/events', elsewhere.cookie);

  await here.put('/api/account/password', { current: CURRENT, next: NEXT });

  expect(await elsewhereSocket.closed).toBe(4401);
  expect((await elsewhere.get('/api/session')).status).toBe(401);
  expect((await here.get('/api/session')).status).toBe(200);
  expect(hereSocket.isOpen()).toBe(true);
});

test('change passphrase, when the current one is wrong: answers 422 beside the field and changes nothing', async () => {
  const kasimir = await app.signIn('kasimir');

  const answer = await kasimir.put('/api/account/password', { current: 'a guess or two', next: NEXT });

  expect(answer.status).toBe(422);
  expect(answer.body.code).toBe('wrong-passphrase');
  expect(answer.body.fields.current).toBe('This is not the passphrase you use now. Nothing was changed.');
  await app.signIn('kasimir');
});

test('change passphrase, when the new one is short: says how long it must be', async () => {
  const kasimir = await app.signIn('kasimir');

  const answer = await kasimir.put('/api/account/password', { current: CURRENT, next: 'short' });

  expect(answer.status).toBe(422);
  expect(answer.body.fields.next).toBe('Use at least 12 characters; four unrelated words do well.');
});

test('sign-ins told by health, when one changed their passphrase: leave that person out', async () => {
  const kasimir = await app.signIn('kasimir');

  await kasimir.put('/api/account/password', { current: CURRENT, next: NEXT });
  const answer = await kasimir.get('/api/health');

  const emails = answer.body.demo.map(({ email }: { email: string }) => email);
  expect(emails).toContain('ines.farrow@skerry.example');
  expect(emails).not.toContain('kasimir.lund@skerry.example');
});
