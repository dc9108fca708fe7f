import { fork } from 'node:child_process';
import type { ChildProcess } from 'node:child_process';
import { existsSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, expect, test } from 'vitest';
import pino from 'pino';
import request from 'supertest';
import { parseEnvironment } from '#server/config/environment.ts';
import { startFailure } from '#server/config/start-failure.ts';
import { startServer } from '#server/start-server.ts';
import { FIRST_START } from '#tests/support/server.ts';
import { ROOT } from '#tests/support/source-files.ts';

let dataFolder: string;
beforeEach(() => {
  dataFolder = join(mkdtempSync(join(tmpdir(), 'holdwater-start-')), 'data');
});
afterEach(() => rmSync(join(dataFolder, '..'), { recursive: true, force: true }));

const start = (variables: Record<string, string> = {}, now = FIRST_START) =>
  startServer({
    environment: parseEnvironment({ NODE_ENV: 'test', PORT: '0', HOLDWATER_DATA: dataFolder, ...variables }),
    logger: pino({ level: 'silent' }),
    now: () => now,
  });

test('first start, on this machine: makes the data folder and loads the demonstration with its sign-ins', async () => {
  const server = await start();

  const health = await request(server.url).get('/api/health');

  expect(existsSync(join(dataFolder, 'holdwater.sqlite'))).toBe(true);
  expect(health.body.ok).toBe(true);
  expect(health.body.demo).toContainEqual({
    name: 'Odile Marsk',
    email: 'odile.marsk@skerry.example',
    passphrase: 'ask where the jet breaks',
    role: 'advisor',
  });
  await server.close();
});

test('later start, a month on: changes nothing of what is there', async () => {
  const first = await start();
  const before = await first.deps.database.models.fights.findAll({ raw: true });
  await first.close();

  const second = await start({}, new Date('2026-04-03T12:00:00Z'));

  expect(await second.deps.database.models.fights.findAll({ raw: true })).toEqual(before);
  await second.close();
});

test('start, where the demonstration is not wanted: there is no team and no sign-in is told', async () => {
  const server = await start({ HOLDWATER_DEMO: '0' });

  const health = await request(server.url).get('/api/health');

  expect(health.body.demo).toBeNull();
  expect(await server.deps.database.models.teams.count()).toBe(0);
  await server.close();
});

test('start, where nobody looks after the installation: has a link for that, and a new one at each start', async () => {
  const first = await start({ HOLDWATER_DEMO: '0', PUBLIC_URL: 'https://holdwater.example' });
  await first.close();
  const second = await start({ HOLDWATER_DEMO: '0' });

  const open = async (link: string | null) =>
    (await request(second.url).get(`/api${new URL(link ?? '').pathname}`)).status;
  expect(first.setupLink).toMatch(/^https:\/\/holdwater\.example\/setup\/[\w-]{43}$/);
  expect(await open(first.setupLink)).toBe(404);
  expect(await open(second.setupLink)).toBe(200);
  await second.close();
});

test('start, with the demonstration: prints no link to set up, for anybody on this machine may read it', async () => {
  const server = await start();

  expect(server.setupLink).toBeNull();
  await server.close();
});

test('start, with the demonstration in the data but not wanted any more: no sign-in is told', async () => {
  await (await start()).close();

  const server = await start({ HOLDWATER_DEMO: '0' });

  expect((await request(server.url).get('/api/health')).body.demo).toBeNull();
  await server.close();
});

test('start, when the port is taken: fails with the reason', async () => {
  const first = await start();
  const { port } = new URL(first.url);

  await expect(start({ PORT: port })).rejects.toThrow(/EADDRINUSE/);

  await first.close();
});

test('program, when told to stop: has said where it was, and ends by itself with 0', async () => {
  const program = fork(join(ROOT, 'server/index.ts'), {
    cwd: ROOT,
    env: { ...process.env, NODE_ENV: 'test', PORT: '0', HOLDWATER_DATA: dataFolder, LOG_LEVEL: 'warn' },
    execArgv: ['--import', 'tsx'],
    stdio: ['ignore', 'pipe', 'pipe', 'ipc'],
  });
  const url = await readyAddress(program);
  expect((await request(url).get('/api/health')).status).toBe(200);

  const ended = new Promise<number | null>((resolve) => program.once('exit', resolve));
  program.kill('SIGTERM');

  expect(await ended).toBe(0);
}, 60_000);

function readyAddress(program: ChildProcess): Promise<string> {
  return new Promise((resolve, reject) => {
    program.once('message', (message: { ready: string }) => resolve(message.ready));
    program.once('exit', (code) => reject(new Error(`ended with ${code}`)));
  });
}

test.each([
  [
    'the port is taken',
    { code: 'EADDRINUSE', port: 4600 },
    'Port 4600 is taken. Stop what uses it, or set PORT to another number.',
  ],
  [
    'the folder may not be written',
    { code: 'EACCES', path: '/var/data' },
    'No permission to write /var/data. Set HOLDWATER_DATA to a folder of yours, or PORT to 1024 or more.',
  ],
])('start that fails, when %s: says what to mend', (_case, facts, sentence) => {
  expect(startFailure(Object.assign(new Error('listen'), facts))).toBe(sentence);
});

test('start that fails, when a variable is wrong: names it', () => {
  const sentence = 'The environment cannot be used. PORT: PORT must be a whole number from 0 to 65535';

  expect(startFailure(new Error(sentence))).toBe(sentence);
});
