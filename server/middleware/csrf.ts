import type { Request, RequestHandler, Response } from 'express';
import { doubleCsrf } from 'csrf-csrf';
import { AppError } from '#server/errors/app-error.ts';
import { notSignedIn } from '#server/errors/refusals.ts';

export interface Csrf {
  /** Refuses every change that does not bring the token of its own session. */
  readonly protect: RequestHandler;
  issue(request: Request, response: Response): string;
}

const STRANGER_MS = 2 * 3_600_000;

/** Double submit: a token bound to the session by HMAC, in an httpOnly cookie and in the header x-csrf-token. */
export function createCsrf(secret: string): Csrf {
  const { doubleCsrfProtection, generateCsrfToken, invalidCsrfTokenError } = doubleCsrf({
    getSecret: () => secret,
    getSessionIdentifier: (request) => request.session.id,
    getCsrfTokenFromRequest: (request) => request.headers['x-csrf-token'],
    cookieName: 'holdwater-csrf',
    cookieOptions: { httpOnly: true, sameSite: 'strict', secure: false, path: '/' },
  });
  return {
    protect(request, response, next) {
      doubleCsrfProtection(request, response, (error?: unknown) => {
        next(error === invalidCsrfTokenError ? refusal(request) : error);
      });
    },
    issue(request, response) {
      request.session.csrf = true;
      // Until somebody signs in, which makes a new session, this one need not be kept for long.
      if (!request.user) request.session.cookie.maxAge = STRANGER_MS;
      return generateCsrfToken(request, response, { overwrite: false, validateOnReuse: false });
    },
  };
}

/** A token that outlived its session means that the session ended: that is what the person must hear. */
function refusal(request: Request): AppError {
  const path = request.baseUrl + request.path;
  const isSigningIn = path === '/api/session' && request.method === 'POST';
  const needsNoAccount = isSigningIn || path.startsWith('/api/copies/');
  if (!request.user && !needsNoAccount) return notSignedIn();
  return new AppError(
    403,
    'csrf',
    'This page is too old to make changes. Load it again and repeat the change.',
  );
}
