import { wrap, type Remote } from 'comlink';
import type { FindingsEngine } from './findings-engine.ts';

export interface RunningEngine {
  readonly engine: FindingsEngine | Remote<FindingsEngine>;
  stop(): void;
}

/** Starts the findings worker; where the browser has none, the same engine runs in the page itself. */
export async function startEngine(): Promise<RunningEngine> {
  if (typeof Worker === 'undefined') {
    const { createFindingsEngine } = await import('./findings-engine.ts');
    return { engine: createFindingsEngine(), stop: () => undefined };
  }
  const worker = new Worker(new URL('../../workers/findings.worker.ts', import.meta.url), { type: 'module' });
  return { engine: wrap<FindingsEngine>(worker), stop: () => worker.terminate() };
}
