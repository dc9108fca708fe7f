import { randomBytes } from 'node:crypto';
import type { RequestHandler } from 'express';
import helmet from 'helmet';

/**
 * Scripts come from our own files only, never inline and never evaluated. Style elements need the nonce of the page
 * they stand in (a dialog stops the page behind it from scrolling with one); style attributes are allowed, because an
 * editor places carets and columns with them. While developing, Vite puts its own inline script and styles into the page.
 */
export function securityHeaders(mode: 'production' | 'development' | 'test'): RequestHandler[] {
  const isLive = mode === 'development';
  return [
    (_request, response, next) => {
      response.locals.styleNonce = randomBytes(16).toString('base64');
      next();
    },
    helmet({
      contentSecurityPolicy: {
        useDefaults: false,
        directives: {
          'default-src': ["'none'"],
          'script-src': ["'self'", ...(isLive ? ["'unsafe-inline'"] : [])],
          'style-src': [
            "'self'",
            (_request, response) =>
              isLive ? "'unsafe-inline'" : `'nonce-${styleNonce(response as { locals?: object })}'`,
          ],
          'style-src-attr': ["'unsafe-inline'"],
          'img-src': ["'self'", 'data:', 'blob:'],
          'font-src': ["'self'"],
          'connect-src': ["'self'"],
          'worker-src': ["'self'"],
          'manifest-src': ["'self'"],
          'base-uri': ["'none'"],
          'form-action': ["'self'"],
          'frame-ancestors': ["'none'"],
          'object-src': ["'none'"],
        },
      },
      referrerPolicy: { policy: 'no-referrer' },
      // Plain HTTP on this machine or network is served as it is; behind TLS the proxy sets it.
      strictTransportSecurity: false,
      xFrameOptions: { action: 'deny' },
    }),
  ];
}

/** The nonce of this response, for its header and for the page it carries. */
export function styleNonce(response: { locals?: { styleNonce?: unknown } }): string {
  return String(response.locals?.styleNonce ?? '');
}
