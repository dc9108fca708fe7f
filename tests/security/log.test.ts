import { afterAll, beforeAll, expect, test } from 'vitest';
import request from 'supertest';
import { createLogger } from '#server/config/logger.ts';
import { SPOUT, startTestServer } from '#tests/support/server.ts';
import type { TestServer } from '#tests/support/server.ts';

let app: TestServer;
beforeAll(async () => {
  app = await startTestServer();
});
afterAll(() => app.stop());

test('log, when people sign in, change things and fail: holds no passphrase, cookie, token, query or word of the team', async () => {
  const ines = await app.signIn('ines');
  await ines.put('/api/account/password', { current: 'a wrong one, really', next: 'tern rock ebb table' });
  await ines.patch(SPOUT, { title: 'A Secret Title' }).set('if-match', '1');
  await ines.get(`${SPOUT}?key=in-the-query`);
  for (const place of ['invitations', 'setup', 'password-resets', 'copies'])
    await ines.get(`/api/${place}/what-opens-it`);
  await request(app.url).post('/api/session').set('authorization', 'Bearer of-bad-news').send('{"broken');

  const log = app.log.join('');
  const session = /holdwater=([^;]+)/.exec(ines.cookie)?.[1] ?? 'no session';
  expect(app.log.length).toBeGreaterThan(6);
  for (const secret of [
    'tern rock tide table',
    'a wrong one, really',
    'tern rock ebb table',
    'A Secret Title',
    'in-the-query',
    'of-bad-news',
    'what-opens-it',
    'ines.farrow',
    ines.token,
    session,
    decodeURIComponent(session),
  ]) {
    expect(log).not.toContain(secret);
  }
});

test('log, when a request was answered: has its id, method, path, status and time', async () => {
  const answer = await request(app.url).get('/api/session');

  const line = app.log
    .map((text) => JSON.parse(text) as Record<string, unknown>)
    .find(({ req }) => (req as { id?: string } | undefined)?.id === answer.headers['x-request-id']);
  expect(line).toMatchObject({
    req: { method: 'GET', path: '/api/session' },
    res: { status: 401 },
    responseTime: expect.any(Number),
  });
});

test('logger, when an object with a secret slips through: hides it', () => {
  const lines: string[] = [];
  const logger = createLogger('info', { write: (line: string) => void lines.push(line) });

  logger.info({
    body: { passphrase: 'hidden words' },
    headers: { cookie: 'hidden words' },
    token: 'hidden words',
  });

  expect(lines.join('')).not.toContain('hidden words');
});
