import { Piscina } from 'piscina';
import type { Logger } from 'pino';
import type { Evidence } from '#shared/evidence/evidence.ts';
import type { Findings } from '#shared/evidence/findings.ts';
import { workerFile } from '#server/config/worker-file.ts';

export interface Evaluation {
  /** Findings of a problem's evidence. Asked twice for the same version, computed once. */
  getFindings(problemId: string, evidence: Evidence): Promise<Findings>;
  close(): Promise<void>;
}

interface Held {
  readonly version: number;
  readonly findings: Promise<Findings>;
}

const MAX_HELD = 40;
/** The largest problem takes about a second; what takes this long is stopped, thread and all. */
const MAX_MS = 60_000;

/** evaluate() in worker threads, so that a long evaluation never holds up a request. Threads start when first needed. */
export function createEvaluation(logger: Logger): Evaluation {
  const held = new Map<string, Held>();
  let pool: Piscina | null = null;

  const compute = (evidence: Evidence): Promise<Findings> => {
    pool ??= createPool(logger);
    return pool.run(evidence, { signal: AbortSignal.timeout(MAX_MS) }) as Promise<Findings>;
  };

  return {
    getFindings(problemId, evidence) {
      const before = held.get(problemId);
      if (before?.version === evidence.version) return before.findings;
      const findings = compute(evidence);
      const entry = { version: evidence.version, findings };
      held.delete(problemId);
      held.set(problemId, entry);
      if (held.size > MAX_HELD) held.delete(held.keys().next().value ?? problemId);
      // A failure is not kept: the next request tries again.
      findings.catch(() => {
        if (held.get(problemId) === entry) held.delete(problemId);
      });
      return findings;
    },
    async close() {
      await pool?.close();
    },
  };
}

function createPool(logger: Logger): Piscina {
  const pool = new Piscina({
    ...workerFile(import.meta.url, 'evaluation/evaluation-worker.ts'),
    name: 'evaluateInWorker',
    minThreads: 0,
    maxThreads: 2,
    idleTimeout: 60_000,
  });
  // A thread that dies fails its task; without a listener it would take the server with it.
  pool.on('error', (error: unknown) => logger.error({ err: error }, 'an evaluation thread failed'));
  return pool;
}
