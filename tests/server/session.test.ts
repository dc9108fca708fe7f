import { afterAll, beforeAll, expect, test } from 'vitest';
import request from 'supertest';
import { clearExpiredSessions } from '#server/features/session/service.ts';
import { FIRST_START, startTestServer } from '#tests/support/server.ts';
import type { SignedIn, TestServer } from '#tests/support/server.ts';

let app: TestServer;
beforeAll(async () => {
  app = await startTestServer();
});
afterAll(() => app.stop());

test('session, when nobody is signed in: answers 401 not-signed-in', async () => {
  const answer = await request(app.url).get('/api/session');

  expect(answer.status).toBe(401);
  expect(answer.body).toMatchObject({ code: 'not-signed-in', status: 401, title: 'Unauthorized' });
});

test('sign in, when e-mail and passphrase fit: answers the person and their teams, and keeps them signed in', async () => {
  const ines = await app.signIn('ines');

  const answer = await ines.get('/api/session');

  expect(answer.status).toBe(200);
  expect(answer.body).toEqual({
    user: { id: 'demo-ines', name: 'Ines Farrow', email: 'ines.farrow@skerry.example' },
    teams: [{ slug: 'tern-rock', name: 'Tern Rock', university: 'Skerry University', role: 'captain' }],
  });
});

test('sign in, when the e-mail is written with capitals: is the same account', async () => {
  const stranger = await app.stranger();

  const answer = await stranger.post('/api/session', {
    email: 'Ines.Farrow@Skerry.example',
    passphrase: 'tern rock tide table',
  });

  expect(answer.status).toBe(200);
});

test.each([
  ['the passphrase is wrong', { email: 'ines.farrow@skerry.example', passphrase: 'tern rock time table' }],
  ['nobody has this e-mail', { email: 'nobody@skerry.example', passphrase: 'tern rock tide table' }],
])('sign in, when %s: answers the same 401 wrong-credentials', async (_case, body) => {
  const stranger = await app.stranger();

  const answer = await stranger.post('/api/session', body);

  expect(answer.status).toBe(401);
  expect(answer.body).toMatchObject({
    code: 'wrong-credentials',
    detail: 'This e-mail and passphrase do not fit together.',
  });
  expect((await stranger.get('/api/session')).status).toBe(401);
});

test('sign in, when the e-mail is not one: answers 422 with a sentence beside the field', async () => {
  const stranger = await app.stranger();

  const answer = await stranger.post('/api/session', { email: 'ines', passphrase: '' });

  expect(answer.status).toBe(422);
  expect(answer.body.code).toBe('invalid');
  expect(answer.body.fields).toEqual({
    email: 'Write the whole address, like ines.farrow@skerry.example.',
    passphrase: 'Write your passphrase.',
  });
});

test('sign in, when it succeeds: the session gets a new id, so that one planted before is worth nothing', async () => {
  const stranger = await app.stranger();

  await stranger.post('/api/session', {
    email: 'maren.tove@skerry.example',
    passphrase: 'paper cups from above',
  });
  const withOldCookie = await stranger.get('/api/session');

  expect(withOldCookie.status).toBe(401);
});

test('sign out, when signed in: ends this session and leaves the others of the person', async () => {
  const here = await app.signIn('petra');
  const elsewhere = await app.signIn('petra');

  const answer = await here.delete('/api/session');

  expect(answer.status).toBe(204);
  expect((await here.get('/api/session')).status).toBe(401);
  expect((await elsewhere.get('/api/session')).status).toBe(200);
});

test('session cookie, when it is set: scripts cannot read it and other sites cannot send it along', async () => {
  const answer = await request(app.url).get('/api/csrf');

  const [cookie] = (answer.get('Set-Cookie') ?? []).filter((line) => line.startsWith('holdwater='));
  expect(cookie).toMatch(/; HttpOnly/);
  expect(cookie).toMatch(/; SameSite=Lax/);
});

test('a disabled person, when their session is still open: is signed out', async () => {
  const kasimir = await app.signIn('kasimir');
  const { database } = app.server.deps;

  await database.write((transaction) =>
    database.models.users.update(
      { disabledAt: '2026-03-03T12:00:00Z' },
      { where: { id: 'demo-kasimir' }, transaction },
    ),
  );

  expect((await kasimir.get('/api/session')).status).toBe(401);
});

test('session, when a fortnight has passed: is over', async () => {
  const maren = await app.signIn('maren');
  const later = new Date(Date.now() + 14 * 86_400_000 + 1000);

  app.setNow(later);
  const answer = await maren.get('/api/session');

  expect(answer.status).toBe(401);
  app.setNow(FIRST_START);
});

test('session of a stranger, when nobody signs in within two hours: is cleared away, those signed in stay', async () => {
  const { database } = app.server.deps;
  const stranger = await app.stranger();
  const ines = await app.signIn('ines');
  const isThere = async ({ cookie }: SignedIn) =>
    (await database.models.sessions.count({ where: { sid: sessionId(cookie) } })) === 1;
  const before = [await isThere(stranger), await isThere(ines)];

  await clearExpiredSessions(database, new Date(Date.now() + 2 * 3_600_000 + 1000));

  expect(before).toEqual([true, true]);
  expect([await isThere(stranger), await isThere(ines)]).toEqual([false, true]);
});

/** The id inside a signed session cookie. */
function sessionId(cookie: string): string {
  const signed = decodeURIComponent(/holdwater=([^;]+)/.exec(cookie)?.[1] ?? '');
  return signed.slice('s:'.length, signed.lastIndexOf('.'));
}
