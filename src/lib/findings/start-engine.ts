import { wrap } from 'comlink';
import workerAddress from 'virtual:findings-worker';
import type { Findings } from '#shared/evidence/findings.ts';
import type { Leak } from '#shared/leaks/leak.ts';
import type { FindingsEngine } from './findings-engine.ts';

export interface RunningEngine {
  readonly engine: FindingsEngine;
  stop(): void;
}

/** Starts the findings worker; where the browser has none, the same engine runs in the page itself. */
export async function startEngine(): Promise<RunningEngine> {
  if (typeof Worker === 'undefined') {
    const { createFindingsEngine } = await import('./findings-engine.ts');
    return { engine: createFindingsEngine(), stop: () => undefined };
  }
  const worker = new Worker(workerAddress, { type: 'module' });
  const remote = wrap<FindingsEngine>(worker);
  // A worker that cannot start answers nothing at all: its error event is the only sign.
  const broken = new Promise<never>((_, reject) => {
    worker.addEventListener('error', (event) =>
      reject(new Error(event.message || 'The worker did not start.')),
    );
  });
  broken.catch(() => undefined);
  return {
    engine: {
      load: (evidence) => Promise.race<Findings>([remote.load(evidence), broken]),
      follow: (steps) => Promise.race<Findings>([remote.follow(steps), broken]),
      leaks: (document) => Promise.race<readonly Leak[]>([remote.leaks(document), broken]),
    },
    stop: () => worker.terminate(),
  };
}
