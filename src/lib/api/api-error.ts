import type { ProblemDetails } from '#shared/contracts/problem-details.ts';

/** Code of an error that never reached the server, or whose answer never came back. */
export const NOT_REACHED = 'server-not-reached';

/** Every way a call can fail. `message` is a sentence for people; `fields` stand beside the inputs they are about. */
export class ApiError extends Error {
  override readonly name = 'ApiError';
  readonly status: number;
  readonly code: string;
  readonly fields: Readonly<Record<string, string>>;
  readonly requestId: string | null;

  constructor(facts: {
    status: number;
    code: string;
    detail: string;
    fields?: Record<string, string> | undefined;
    requestId?: string | undefined;
    cause?: unknown;
  }) {
    super(facts.detail, { cause: facts.cause });
    this.status = facts.status;
    this.code = facts.code;
    this.fields = facts.fields ?? {};
    this.requestId = facts.requestId ?? null;
  }

  static notReached(cause: unknown): ApiError {
    return new ApiError({
      status: 0,
      code: NOT_REACHED,
      detail: 'The server cannot be reached. Nothing you typed is lost; try again when it is back.',
      cause,
    });
  }
}

/** Reads an answer that is not a success; a body that is not problem+json still becomes a sentence. */
export async function toApiError(response: Response): Promise<ApiError> {
  const body: unknown = await response.json().catch(() => null);
  if (isProblemDetails(body)) {
    return new ApiError({ ...body, status: response.status });
  }
  return new ApiError({
    status: response.status,
    code: 'unexpected-answer',
    detail: `The server answered with status ${response.status} and no reason. Try again in a moment.`,
  });
}

function isProblemDetails(body: unknown): body is ProblemDetails {
  return (
    typeof body === 'object' &&
    body !== null &&
    'code' in body &&
    typeof body.code === 'string' &&
    'detail' in body &&
    typeof body.detail === 'string'
  );
}

/** The sentence to show for anything that was thrown. */
export function sentenceOf(error: unknown): string {
  if (error instanceof ApiError) return error.message;
  return 'Something went wrong in this page. Load it again; what was kept is safe.';
}
