/** The real app on a free port with a fresh data folder, and people signed in to it. */
import { createHash } from 'node:crypto';
import { copyFileSync, existsSync, mkdirSync, mkdtempSync, renameSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import pino from 'pino';
import request from 'supertest';
import { parseEnvironment } from '#server/config/environment.ts';
import { DEMO_PEOPLE } from '#server/database/seeders/demo/people.ts';
import type { ServerOptions, RunningServer } from '#server/start-server.ts';
import { startServer } from '#server/start-server.ts';
import { readSource, sourceFiles } from './source-files.ts';

/** The moment every test server believes it is first started. */
export const FIRST_START = new Date('2026-03-03T12:00:00.000Z');

export type DemoName = 'ines' | 'kasimir' | 'maren' | 'petra' | 'odile' | 'sunniva';

/** Captain, members and advisor of Tern Rock, and the captain of Gannet Bank. */
export interface TestServer {
  readonly url: string;
  readonly server: RunningServer;
  readonly dataFolder: string;
  /** Lines of the log so far. */
  readonly log: readonly string[];
  /** A person with their own cookies and token. */
  signIn(name: DemoName): Promise<SignedIn>;
  /** Anybody with an account, by what they type. */
  signInWith(email: string, passphrase: string): Promise<SignedIn>;
  /** Somebody with cookies and a token, but not signed in. */
  stranger(): Promise<SignedIn>;
  /** Sets the clock. */
  setNow(now: Date): void;
  stop(): Promise<void>;
}

export interface SignedIn {
  readonly cookie: string;
  readonly token: string;
  get(path: string): request.Test;
  post(path: string, body?: object): request.Test;
  put(path: string, body?: object): request.Test;
  patch(path: string, body?: object): request.Test;
  delete(path: string, body?: object): request.Test;
}

/** Problem 1 of Tern Rock. */
export const SPOUT = '/api/teams/tern-rock/problems/1';

export async function startTestServer(options: Partial<ServerOptions> = {}): Promise<TestServer> {
  const dataFolder = mkdtempSync(join(tmpdir(), 'holdwater-test-'));
  copyFileSync(await migratedBase(), join(dataFolder, 'holdwater.sqlite'));
  let now = FIRST_START;
  const log: string[] = [];
  const server = await startServer({
    environment: testEnvironment(dataFolder),
    logger: pino({ base: null }, { write: (line: string) => void log.push(line) }),
    now: () => now,
    ...options,
  });
  return {
    url: server.url,
    server,
    dataFolder,
    log,
    signIn: (name) => signIn(server.url, name),
    signInWith: (email, passphrase) => signInWith(server.url, email, passphrase),
    stranger: () => withToken(server.url, new Map()),
    setNow(next) {
      now = next;
    },
    async stop() {
      await server.close();
      rmSync(dataFolder, { recursive: true, force: true });
    },
  };
}

function testEnvironment(dataFolder: string) {
  return parseEnvironment({ NODE_ENV: 'test', PORT: '0', HOLDWATER_DATA: dataFolder });
}

/** One for each run and each form of the database, so that none of an older form is ever copied. */
const BASE_FOLDER = join(tmpdir(), `holdwater-base-${process.ppid}-${databaseForm()}`);

function databaseForm(): string {
  const hash = createHash('sha256');
  for (const path of sourceFiles('server/database', 'server/features/evidence'))
    hash.update(readSource(path));
  return hash.digest('hex').slice(0, 16);
}

/** Migrated and seeded once for each run of the tests, then copied: hashing passphrases takes its time. */
async function migratedBase(): Promise<string> {
  const base = join(BASE_FOLDER, 'base.sqlite');
  if (existsSync(base)) return base;
  const own = mkdtempSync(join(tmpdir(), 'holdwater-seed-'));
  const server = await startServer({
    environment: testEnvironment(own),
    logger: pino({ level: 'silent' }),
    now: () => FIRST_START,
  });
  await server.close();
  mkdirSync(BASE_FOLDER, { recursive: true });
  // Test files run at the same time: whoever is last wins, with the same content.
  renameSync(join(own, 'holdwater.sqlite'), base);
  rmSync(own, { recursive: true, force: true });
  return base;
}

async function signIn(url: string, name: DemoName): Promise<SignedIn> {
  const person = DEMO_PEOPLE.find(({ id }) => id === `demo-${name}`);
  if (!person) throw new RangeError(`signIn: needs a person of the demonstration, got ${name}`);
  return signInWith(url, person.email, person.passphrase);
}

async function signInWith(url: string, email: string, passphrase: string): Promise<SignedIn> {
  const cookies = new Map<string, string>();
  const before = await withToken(url, cookies);
  const answer = await before.post('/api/session', { email, passphrase });
  if (answer.status !== 200) throw new Error(`signIn: answered ${answer.status} ${answer.text}`);
  keepCookies(cookies, answer);
  return withToken(url, cookies);
}

/** Asks for a token with these cookies and gives the means to call with both. */
async function withToken(url: string, cookies: Map<string, string>): Promise<SignedIn> {
  const answer = await request(url).get('/api/csrf').set('cookie', cookieHeader(cookies));
  keepCookies(cookies, answer);
  const token = String((answer.body as { token?: unknown }).token);
  const cookie = cookieHeader(cookies);
  const change = (test: request.Test, body: object | undefined) => {
    const asked = test.set('cookie', cookie).set('x-csrf-token', token);
    return body === undefined ? asked : asked.send(body);
  };
  return {
    cookie,
    token,
    get: (path) => request(url).get(path).set('cookie', cookie),
    post: (path, body) => change(request(url).post(path), body),
    put: (path, body) => change(request(url).put(path), body),
    patch: (path, body) => change(request(url).patch(path), body),
    delete: (path, body) => change(request(url).delete(path), body),
  };
}

function keepCookies(cookies: Map<string, string>, answer: request.Response): void {
  const set = answer.get('Set-Cookie') ?? [];
  for (const line of set) {
    const [pair = ''] = line.split(';');
    const at = pair.indexOf('=');
    cookies.set(pair.slice(0, at), pair.slice(at + 1));
  }
}

function cookieHeader(cookies: ReadonlyMap<string, string>): string {
  return [...cookies].map(([name, value]) => `${name}=${value}`).join('; ');
}
