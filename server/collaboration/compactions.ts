import type { Logger } from 'pino';

/** Runs one compaction a document at a time; a failure is logged, since the log on disk has everything anyway. */
export class Compactions {
  readonly #running = new Map<string, Promise<void>>();
  readonly #logger: Logger;

  constructor(logger: Logger) {
    this.#logger = logger;
  }

  run(problemId: string, work: () => Promise<void>): Promise<void> {
    const next = (this.#running.get(problemId) ?? Promise.resolve()).then(work).catch((error: unknown) => {
      this.#logger.error({ err: error, problemId }, 'a report could not be drawn together');
    });
    this.#running.set(problemId, next);
    return next;
  }

  async idle(): Promise<void> {
    await Promise.all(this.#running.values());
  }
}
