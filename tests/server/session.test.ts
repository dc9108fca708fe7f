import { afterAll, beforeAll, expect, test } from 'vitest';
import request from 'supertest';
import { SPOUT, startTestServer } from '#tests/support/server.ts';
import type { TestServer } from '#tests/support/server.ts';

let app: TestServer;
beforeAll(async () => {
  app = await startTestServer();
});
afterAll(() => app.stop());

test('session, when nobody is signed in: answers 401 not-signed-in', async () => {
  const answer = await request(app.url).get('/api/session');

  expect(answer.status).toBe(401);
  expect(answer.type).toBe('application/problem+json');
  expect(answer.body).toMatchObject({ code: 'not-signed-in', status: 401, title: 'Unauthorized' });
  expect(answer.body.requestId).toBe(answer.headers['x-request-id']);
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

test('evidence, when a member asks: answers it with its version as ETag, and 304 the second time', async () => {
  const kasimir = await app.signIn('kasimir');

  const first = await kasimir.get(`${SPOUT}/evidence`);
  const again = await kasimir.get(`${SPOUT}/evidence`).set('if-none-match', String(first.headers.etag));

  expect(first.status).toBe(200);
  expect(first.headers.etag).toBe(`"${first.body.evidence.version}"`);
  expect(again.status).toBe(304);
});
