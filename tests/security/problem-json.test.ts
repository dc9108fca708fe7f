import { afterAll, beforeAll, expect, test } from 'vitest';
import express from 'express';
import request from 'supertest';
import pino from 'pino';
import { problemDetailsSchema } from '#shared/contracts/problem-details.ts';
import { problemJson } from '#server/errors/problem-json.ts';
import { requestId } from '#server/middleware/request-id.ts';
import { startTestServer } from '#tests/support/server.ts';
import type { TestServer } from '#tests/support/server.ts';

let app: TestServer;
beforeAll(async () => {
  app = await startTestServer();
});
afterAll(() => app.stop());

test.each([
  ['an address that is not there', '/api/nothing', 404, 'not-found'],
  ['an address outside the API, when no client is served', '/nothing', 404, 'not-found'],
  ['an address that cannot be decoded', '/api/teams/%E0%A4%A', 404, 'not-found'],
  ['no session', '/api/session', 401, 'not-signed-in'],
])('error, for %s: is problem+json with its request id', async (_case, path, status, code) => {
  const answer = await request(app.url).get(path);

  expect(answer.status).toBe(status);
  expect(answer.type).toBe('application/problem+json');
  const problem = problemDetailsSchema.parse(answer.body);
  expect(problem).toMatchObject({ code, status, requestId: answer.headers['x-request-id'] });
});

test('error, for a body that is not JSON: answers 400 not-json', async () => {
  const stranger = await app.stranger();

  const answer = await stranger
    .post('/api/session')
    .set('content-type', 'application/json')
    .send('{"email":');

  expect(answer.status).toBe(400);
  expect(answer.body.code).toBe('not-json');
});

test('error, for a body beyond the bound: answers 413 too-large', async () => {
  const stranger = await app.stranger();

  const answer = await stranger.post('/api/session', { email: 'x'.repeat(2_100_000) });

  expect(answer.status).toBe(413);
  expect(answer.body.code).toBe('too-large');
});

test('error, for a bug of ours: answers a bare 500 and logs it whole', async () => {
  const lines: string[] = [];
  const broken = express();
  broken.use(requestId);
  broken.get('/', () => {
    throw new TypeError('inner workings');
  });
  broken.use(problemJson(pino({ base: null }, { write: (line: string) => void lines.push(line) })));

  const answer = await request(broken).get('/');

  expect(answer.status).toBe(500);
  expect(answer.text).not.toContain('inner workings');
  expect(answer.body).toMatchObject({ code: 'internal', detail: 'Something went wrong here. Try again.' });
  expect(lines.join('')).toContain('inner workings');
  expect(lines.join('')).toContain(answer.body.requestId);
});
