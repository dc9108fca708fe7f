import type { RequestHandler } from 'express';
import type { Logger } from 'pino';
import { pinoHttp } from 'pino-http';

/**
 * One line for each answered request of the API: method, path, status, time. Never a header, a query or a body, for
 * those carry cookies, tokens, passphrases and the team's work.
 */
export function requestLog(logger: Logger): RequestHandler {
  return pinoHttp({
    logger,
    wrapSerializers: false,
    genReqId: (request) => ('requestId' in request ? String(request.requestId) : ''),
    autoLogging: { ignore: (request) => !(request.url ?? '').startsWith('/api/') },
    customLogLevel: (_request, response, error) => (error || response.statusCode >= 500 ? 'error' : 'info'),
    serializers: {
      req: (request: { id: unknown; method: string; url: string; originalUrl?: string }) => ({
        id: request.id,
        method: request.method,
        path: withoutToken((request.originalUrl ?? request.url).split('?')[0] ?? ''),
      }),
      res: (response: { statusCode: number }) => ({ status: response.statusCode }),
      err: (error: { type?: string }) => ({ type: error.type ?? 'Error' }),
    },
  });
}

/** A token in an address opens what it belongs to: it is left out, what is asked stays. */
function withoutToken(path: string): string {
  return path.replace(/^(\/api\/(?:copies|invitations|password-resets|setup)\/)[^/]+/i, '$1…');
}
