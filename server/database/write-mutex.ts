/** Runs one piece of work at a time, in the order asked for. Not re-entrant: work must not ask again from inside. */
export class WriteMutex {
  #last: Promise<unknown> = Promise.resolve();

  run<T>(work: () => Promise<T>): Promise<T> {
    const result = this.#last.then(work);
    this.#last = result.catch(() => undefined);
    return result;
  }

  /** Settles when everything asked for so far is done. */
  async idle(): Promise<void> {
    await this.#last;
  }
}
