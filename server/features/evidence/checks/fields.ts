import { invalid } from '#server/errors/refusals.ts';

/** Collects a sentence for each field that cannot be taken, the first for each. */
export class Fields {
  readonly #sentences: Record<string, string> = {};

  refuse(path: string, sentence: string): void {
    this.#sentences[path] ??= sentence;
  }

  /** Throws 422 `invalid` when anything was refused. */
  assertNone(): void {
    if (Object.keys(this.#sentences).length > 0) throw invalid(this.#sentences);
  }
}
