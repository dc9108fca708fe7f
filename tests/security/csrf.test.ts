import { afterAll, beforeAll, expect, test } from 'vitest';
import request from 'supertest';
import { SPOUT, startTestServer } from '#tests/support/server.ts';
import type { SignedIn, TestServer } from '#tests/support/server.ts';

let app: TestServer;
let ines: SignedIn;
beforeAll(async () => {
  app = await startTestServer();
  ines = await app.signIn('ines');
});
afterAll(() => app.stop());

const change = (person: SignedIn) =>
  request(app.url).patch(SPOUT).set('cookie', person.cookie).set('if-match', '1').send({ title: 'Other' });

test('change, when it brings no token: answers 403 csrf and nothing is changed', async () => {
  const answer = await change(ines);

  expect(answer.status).toBe(403);
  expect(answer.body.code).toBe('csrf');
  expect((await ines.get(SPOUT)).body.title).toBe('Leaning Spout');
});

test('change, when it brings the token of another session: answers 403 csrf', async () => {
  const kasimir = await app.signIn('kasimir');

  const answer = await change(ines).set('x-csrf-token', kasimir.token);

  expect(answer.status).toBe(403);
});

test('change, when it brings token and cookie of another session: answers 403 csrf, for the token is bound to its own', async () => {
  const kasimir = await app.signIn('kasimir');
  const theirs = /holdwater-csrf=[^;]*/.exec(kasimir.cookie)?.[0] ?? '';
  const mixed = ines.cookie.replace(/holdwater-csrf=[^;]*/, theirs);

  const answer = await request(app.url)
    .patch(SPOUT)
    .set('cookie', mixed)
    .set('x-csrf-token', kasimir.token)
    .set('if-match', '1')
    .send({ title: 'Other' });

  expect(answer.status).toBe(403);
});

test('sign in, when it brings no token: answers 403, so that nobody is signed in to an account of an attacker', async () => {
  const answer = await request(app.url)
    .post('/api/session')
    .send({ email: 'ines.farrow@skerry.example', passphrase: 'tern rock tide table' });

  expect(answer.status).toBe(403);
});

test('change, when the session has ended meanwhile: answers 401, so that the person is asked to sign in again', async () => {
  const petra = await app.signIn('petra');
  await petra.delete('/api/session');

  const answer = await petra.patch(SPOUT, { title: 'Other' }).set('if-match', '1');

  expect(answer.status).toBe(401);
  expect(answer.body.code).toBe('not-signed-in');
});

test('token, when the person has signed in since: is issued anew for the new session', async () => {
  const stranger = await app.stranger();

  const signedIn = await app.signIn('maren');

  expect(signedIn.token).not.toBe(stranger.token);
  expect((await signedIn.patch(SPOUT, {}).set('if-match', '99')).status).toBe(409);
});
