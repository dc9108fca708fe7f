import { afterAll, beforeAll, expect, test } from 'vitest';
import request from 'supertest';
import { startTestServer } from '#tests/support/server.ts';
import type { TestServer } from '#tests/support/server.ts';

let app: TestServer;
beforeAll(async () => {
  app = await startTestServer();
});
afterAll(() => app.stop());

test('Content-Security-Policy, on any answer: scripts only from our own files, never inline, never evaluated', async () => {
  const answer = await request(app.url).get('/api/health');

  const policy = String(answer.headers['content-security-policy']);
  const directives = new Map(
    policy.split(';').map((directive): [string, string] => {
      const [name = '', ...sources] = directive.trim().split(' ');
      return [name, sources.join(' ')];
    }),
  );
  expect(directives.get('script-src')).toBe("'self'");
  expect(directives.get('default-src')).toBe("'none'");
  expect(directives.get('style-src')).toMatch(/^'self' 'nonce-[^' ]+'$/);
  expect(directives.get('frame-ancestors')).toBe("'none'");
  expect(directives.get('base-uri')).toBe("'none'");
  expect(policy).not.toContain('unsafe-eval');
  expect(directives.has('upgrade-insecure-requests')).toBe(false);
});

test('headers, on any answer: no referrer, no sniffing, no frame, nothing about what serves it', async () => {
  const { headers } = await request(app.url).get('/api/health');

  expect(headers['referrer-policy']).toBe('no-referrer');
  expect(headers['x-content-type-options']).toBe('nosniff');
  expect(headers['x-frame-options']).toBe('DENY');
  expect(headers).not.toHaveProperty('x-powered-by');
  expect(headers).not.toHaveProperty('strict-transport-security');
});

test('answers of the API, when they are of a team: are kept in no cache', async () => {
  const ines = await app.signIn('ines');

  const answer = await ines.get('/api/teams/tern-rock');

  expect(answer.headers['cache-control']).toBe('no-store');
});
