import { createHash, randomBytes } from 'node:crypto';

const TOKEN_BYTES = 32;

/** 43 characters that nobody guesses; told once. */
export function newSecretToken(): string {
  return randomBytes(TOKEN_BYTES).toString('base64url');
}

/** What is kept of a token. It holds 256 random bits, so a plain hash cannot be searched back. */
export function hashSecretToken(token: string): string {
  return createHash('sha256').update(token).digest('hex');
}
