import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, expect, test } from 'vitest';
import express from 'express';
import type { Express } from 'express';
import request from 'supertest';
import pino from 'pino';
import { serveBuiltClient } from '#server/client.ts';
import { problemJson } from '#server/errors/problem-json.ts';
import { securityHeaders } from '#server/middleware/security-headers.ts';
import { requestId } from '#server/middleware/request-id.ts';

let folder: string;
let app: Express;
beforeAll(async () => {
  folder = mkdtempSync(join(tmpdir(), 'holdwater-client-'));
  mkdirSync(join(folder, 'assets'));
  writeFileSync(
    join(folder, 'index.html'),
    '<!doctype html><meta name="style-nonce" content="{style-nonce}"><title>Holdwater</title>',
  );
  writeFileSync(join(folder, 'assets', 'main-abc123.js'), 'export {};');
  writeFileSync(join(folder, 'mark.svg'), '<svg xmlns="http://www.w3.org/2000/svg"/>');
  app = express();
  const { handler } = await serveBuiltClient(folder);
  app.use(requestId, ...securityHeaders('production'), handler, problemJson(pino({ level: 'silent' })));
});
afterAll(() => rmSync(folder, { recursive: true }));

test.each(['/', '/team/tern-rock', '/team/tern-rock/problem/1/report', '/index.html'])(
  'page %s, when asked for: is index.html, which is never kept',
  async (path) => {
    const answer = await request(app).get(path);

    expect(answer.status).toBe(200);
    expect(answer.text).toContain('<title>Holdwater</title>');
    expect(answer.headers['cache-control']).toBe('no-store');
  },
);

test('page, when asked for twice: carries the nonce of its own policy, another each time', async () => {
  const answers = [await request(app).get('/'), await request(app).get('/')];

  const nonces = answers.map(({ text }) => /content="([^"]+)"/.exec(text)?.[1] ?? '');
  expect(nonces[0]).toMatch(/^[A-Za-z0-9+/]{22}==$/);
  expect(nonces[0]).not.toBe(nonces[1]);
  expect(answers[0]?.headers['content-security-policy']).toContain(`style-src 'self' 'nonce-${nonces[0]}';`);
});

test('asset with a hash in its name, when asked for: is kept for a year', async () => {
  const answer = await request(app).get('/assets/main-abc123.js');

  expect(answer.headers['cache-control']).toBe('public, max-age=31536000, immutable');
  expect(answer.type).toMatch(/javascript/);
});

test('asset of an older build, when asked for: answers 404 and no page, so that the tab notices', async () => {
  const answer = await request(app).get('/assets/main-old.js');

  expect(answer.status).toBe(404);
  expect(answer.text).not.toContain('<title>');
});

test('other file, when asked for: is served and asked for anew', async () => {
  const answer = await request(app).get('/mark.svg');

  expect(answer.type).toBe('image/svg+xml');
  expect(answer.headers['cache-control']).toBe('no-cache');
});

test.each(['/../package.json', '/assets/..%2f..%2fpackage.json', '/%2e%2e/package.json'])(
  'path %s out of the folder, when asked for: gives nothing from there',
  async (path) => {
    const answer = await request(app).get(path);

    expect(answer.text).not.toContain('"dependencies"');
  },
);
