import type { RequestHandler } from 'express';
import helmet from 'helmet';

/**
 * Scripts come from our own files only, never inline and never evaluated. Style attributes are allowed, because typeset
 * formulas are placed with them; style elements are not. While developing, Vite puts its own inline script and style
 * elements into the page.
 */
export function securityHeaders(mode: 'production' | 'development' | 'test'): RequestHandler {
  const inline = mode === 'development' ? ["'unsafe-inline'"] : [];
  return helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        'default-src': ["'none'"],
        'script-src': ["'self'", ...inline],
        'style-src': ["'self'", ...inline],
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
  });
}
