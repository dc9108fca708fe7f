import { MessageChannel } from 'node:worker_threads';
import { Piscina } from 'piscina';
import type { Logger } from 'pino';
import { workerFile } from '#server/config/worker-file.ts';
import type { OnProgress, ReportPdf, ReportPdfInput } from './report-pdf.ts';
import type { RenderProgress, RenderTask } from './report-worker.ts';

export interface ReportRenderer {
  /** Prints a report in a thread of its own. Aborting stops the thread and rejects. */
  render(
    input: ReportPdfInput,
    options?: { readonly signal?: AbortSignal; readonly onProgress?: OnProgress },
  ): Promise<ReportPdf>;
  close(): Promise<void>;
}

const IDLE_MS = 120_000;

/** Threads that keep their parsed faces between reports; they start when first needed. */
export function createReportRenderer(logger: Logger): ReportRenderer {
  let pool: Piscina | null = null;
  return {
    async render(input, { signal, onProgress } = {}) {
      pool ??= createPool(logger);
      const { port1, port2 } = new MessageChannel();
      port1.on('message', ({ share, at }: RenderProgress) => onProgress?.(share, at));
      port1.unref();
      const task: RenderTask = { input, port: port2 };
      try {
        const options = { transferList: [port2], ...(signal ? { signal } : {}) };
        return (await pool.run(task, options)) as ReportPdf;
      } finally {
        port1.close();
      }
    },
    async close() {
      await pool?.destroy();
      pool = null;
    },
  };
}

function createPool(logger: Logger): Piscina {
  const pool = new Piscina({
    ...workerFile(import.meta.url, 'rendering/report-worker.ts'),
    name: 'renderInWorker',
    minThreads: 0,
    maxThreads: 2,
    idleTimeout: IDLE_MS,
  });
  // A thread that dies fails its task; without a listener it would take the server with it.
  pool.on('error', (error: unknown) => logger.error({ err: error }, 'a rendering thread failed'));
  return pool;
}
