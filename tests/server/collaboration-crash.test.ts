/** The server killed without warning while somebody types: nothing that was acknowledged may be missing. */
import { spawn, type ChildProcess } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { DEMO_PEOPLE } from '#server/database/seeders/demo/people.ts';
import { openReport } from '#tests/support/report-client.ts';
import { ROOT } from '#tests/support/source-files.ts';

let data: string;
beforeAll(() => {
  data = mkdtempSync(join(tmpdir(), 'holdwater-crash-'));
});
afterAll(() => rmSync(data, { recursive: true, force: true }));

function launch(port: string): Promise<{ child: ChildProcess; url: string }> {
  return new Promise((resolve, reject) => {
    const child = spawn(process.execPath, ['--import', 'tsx', 'server/index.ts'], {
      cwd: ROOT,
      env: { ...process.env, NODE_ENV: 'test', PORT: port, HOLDWATER_DATA: data, LOG_LEVEL: 'silent' },
      stdio: ['ignore', 'ignore', 'inherit', 'ipc'],
    });
    child.on(
      'message',
      (message: { ready?: string }) => message.ready && resolve({ child, url: message.ready }),
    );
    child.on('exit', (code) => reject(new Error(`the server ended with ${code}`)));
  });
}

async function cookieOf(url: string): Promise<string> {
  const person = DEMO_PEOPLE.find(({ id }) => id === 'demo-kasimir');
  const first = await fetch(`${url}/api/csrf`);
  const cookies = (answer: Response) => answer.headers.getSetCookie().map((line) => line.split(';')[0] ?? '');
  const { token } = (await first.json()) as { token: string };
  const jar = new Map(cookies(first).map((pair) => pair.split('=', 2) as [string, string]));
  const header = () => [...jar].map(([name, value]) => `${name}=${value}`).join('; ');
  const answer = await fetch(`${url}/api/session`, {
    method: 'POST',
    headers: { 'content-type': 'application/json', 'x-csrf-token': token, cookie: header() },
    body: JSON.stringify({ email: person?.email, passphrase: person?.passphrase }),
  });
  expect(answer.status).toBe(200);
  for (const pair of cookies(answer)) {
    const [name = '', value = ''] = pair.split('=', 2);
    jar.set(name, value);
  }
  return header();
}

test('kill -9 while typing: every acknowledged line is there after the restart', async () => {
  const first = await launch('0');
  const cookie = await cookieOf(first.url);
  const writer = openReport(first.url, cookie);
  await writer.ready;
  const acknowledged: string[] = [];
  const typing = (async () => {
    for (let n = 0; n < 400; n += 1) {
      const line = `line ${n} typed`;
      writer.type(3, line);
      await writer.kept();
      if (first.child.signalCode !== null || first.child.killed) return;
      acknowledged.push(line);
    }
  })();
  await expect.poll(() => acknowledged.length, { timeout: 15_000 }).toBeGreaterThan(60);

  first.child.kill('SIGKILL');
  writer.close();
  await Promise.race([typing, new Promise((resolve) => setTimeout(resolve, 200))]);

  const second = await launch('0');
  const reader = openReport(second.url, cookie);
  await reader.ready;
  const text = reader.text();
  reader.close();
  second.child.removeAllListeners('exit');
  second.child.kill('SIGTERM');
  expect(acknowledged.filter((line) => !text.includes(line))).toEqual([]);
}, 60_000);
