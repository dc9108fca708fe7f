import { STATUS_CODES } from 'node:http';
import type { ErrorRequestHandler } from 'express';
import type { Logger } from 'pino';
import type { ProblemDetails } from '#shared/contracts/problem-details.ts';
import { AppError } from './app-error.ts';
import { notFound } from './refusals.ts';

/** Answers every error as application/problem+json. What is not an AppError is a bug: logged whole, told as a bare 500. */
export function problemJson(logger: Logger): ErrorRequestHandler {
  return (error: unknown, request, response, next) => {
    if (response.headersSent) {
      next(error);
      return;
    }
    const known = error instanceof AppError ? error : fromLibrary(error);
    if (known === null) logger.error({ err: error, requestId: request.requestId }, 'unexpected error');
    const shown = known ?? new AppError(500, 'internal', 'Something went wrong here. Try again.');
    const body: ProblemDetails = {
      type: 'about:blank',
      title: STATUS_CODES[shown.status] ?? 'Error',
      status: shown.status,
      code: shown.code,
      detail: shown.message,
      requestId: request.requestId,
      ...(shown.fields ? { fields: shown.fields } : {}),
    };
    response.status(shown.status).type('application/problem+json').send(JSON.stringify(body));
  };
}

/** Errors that middleware of others throws for a bad request. */
function fromLibrary(error: unknown): AppError | null {
  if (!(error instanceof Error)) return null;
  const type = 'type' in error ? error.type : undefined;
  if (type === 'entity.parse.failed') {
    return new AppError(400, 'not-json', 'The request is not valid JSON.', { cause: error });
  }
  if (type === 'entity.too.large' || ('code' in error && error.code === 'LIMIT_FILE_SIZE')) {
    return new AppError(413, 'too-large', 'This is larger than is accepted here.', { cause: error });
  }
  if ('code' in error && typeof error.code === 'string' && error.code.startsWith('LIMIT_')) {
    return new AppError(400, 'not-one-file', 'Send one file, in the field named file.', { cause: error });
  }
  const status = 'status' in error ? error.status : undefined;
  if (error instanceof URIError || status === 404) return notFound();
  if (typeof status === 'number' && status >= 400 && status < 500) {
    return new AppError(status, 'bad-request', 'The request cannot be read.', { cause: error });
  }
  return null;
}
