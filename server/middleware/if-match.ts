import type { Request } from 'express';
import { AppError } from '#server/errors/app-error.ts';

/** The row version a change was made on, from If-Match ("3" or 3); 428 `needs-version` without one. */
export function getIfMatch(request: Request): number {
  const header = request.headers['if-match'] ?? '';
  const match = /^"?(\d{1,9})"?$/.exec(header);
  if (!match) {
    throw new AppError(428, 'needs-version', 'Say with If-Match which version this change was made on.');
  }
  return Number(match[1]);
}
