/** The built app as a process of its own on a fresh data folder: what a person starts, killed as a person would. */
import { fork, type ChildProcess } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { ROOT } from './source-files.ts';

export interface RunningApp {
  readonly url: string;
  readonly data: string;
  /** kill -9: no chance to tidy up. */
  kill(): Promise<void>;
  /** Starts it again on the same port and data. */
  restart(): Promise<void>;
  stop(): Promise<void>;
}

export async function startApp(): Promise<RunningApp> {
  const data = mkdtempSync(join(tmpdir(), 'holdwater-e2e-'));
  let { child, url } = await launch(data, '0');
  const port = new URL(url).port;
  return {
    get url() {
      return url;
    },
    data,
    async kill() {
      await ended(child, 'SIGKILL');
    },
    async restart() {
      ({ child, url } = await launch(data, port));
    },
    async stop() {
      await ended(child, 'SIGTERM');
      rmSync(data, { recursive: true, force: true });
    },
  };
}

function launch(data: string, port: string): Promise<{ child: ChildProcess; url: string }> {
  return new Promise((resolve, reject) => {
    const child = fork(join(ROOT, 'dist/server/index.js'), {
      cwd: ROOT,
      env: { ...process.env, NODE_ENV: 'production', HOLDWATER_DATA: data, PORT: port, LOG_LEVEL: 'warn' },
      stdio: ['ignore', 'pipe', 'pipe', 'ipc'],
    });
    let said = '';
    child.stdout?.on('data', (chunk) => (said += chunk));
    child.stderr?.on('data', (chunk) => (said += chunk));
    child.on('message', (message: { ready?: string }) => {
      if (message.ready) resolve({ child, url: message.ready });
    });
    child.on('exit', (code) =>
      reject(new Error(`The server ended with ${code} before it was ready:\n${said}`)),
    );
  });
}

function ended(child: ChildProcess, signal: NodeJS.Signals): Promise<void> {
  if (child.exitCode !== null || child.signalCode !== null) return Promise.resolve();
  return new Promise((resolve) => {
    child.once('exit', () => resolve());
    child.kill(signal);
  });
}
