/** Something that is expected to go wrong: answered with its status, a stable code and a sentence for people. */
export class AppError extends Error {
  readonly status: number;
  readonly code: string;
  /** Sentences beside the inputs they are about, by field path. */
  readonly fields: Readonly<Record<string, string>> | undefined;

  constructor(
    status: number,
    code: string,
    message: string,
    options: { readonly fields?: Readonly<Record<string, string>>; readonly cause?: unknown } = {},
  ) {
    super(message, { cause: options.cause });
    this.name = 'AppError';
    this.status = status;
    this.code = code;
    this.fields = options.fields;
  }
}
