import pino from 'pino';
import type { DestinationStream, Logger } from 'pino';

/**
 * Structured log on standard error. What could carry a secret is never passed to it (see request-log.ts); these
 * paths are a second guard, should an object slip through whole.
 */
export function createLogger(level: string, destination: DestinationStream = pino.destination(2)): Logger {
  return pino(
    {
      level,
      base: null,
      redact: {
        paths: [
          'passphrase',
          'current',
          'next',
          'token',
          'cookie',
          'authorization',
          '*.passphrase',
          '*.current',
          '*.next',
          '*.token',
          '*.cookie',
          '*.authorization',
          'headers',
          '*.headers',
          'body',
          '*.body',
        ],
        censor: '(hidden)',
      },
    },
    destination,
  );
}
