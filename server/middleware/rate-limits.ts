import { rateLimit } from 'express-rate-limit';
import type { Request, RequestHandler } from 'express';
import { AppError } from '#server/errors/app-error.ts';

/** How many may be tried within `minutes`. */
export interface Limits {
  readonly minutes: number;
  /** Failed sign-ins from one address: a whole team may sit behind it. */
  readonly failuresPerAddress: number;
  /** Failed sign-ins for one account, wherever they come from. */
  readonly failuresPerAccount: number;
}

export const DEFAULT_LIMITS: Limits = { minutes: 15, failuresPerAddress: 60, failuresPerAccount: 10 };

/** Slows down guessing: 429 `too-many-attempts`. Successful sign-ins do not count. */
export function signInLimits(limits: Limits): RequestHandler[] {
  return [
    failureLimit(limits.minutes, limits.failuresPerAddress, undefined),
    failureLimit(limits.minutes, limits.failuresPerAccount, accountOf),
  ];
}

/** The same for the passphrase asked for when it is changed. */
export function passphraseLimits(limits: Limits): RequestHandler[] {
  return [failureLimit(limits.minutes, limits.failuresPerAccount, (request) => request.user?.id ?? 'nobody')];
}

/** Slows down whoever tries one address of a lent copy after another, or guesses its passphrase. Reading does not count. */
export function tokenLimit(limits: Limits): RequestHandler {
  return failureLimit(limits.minutes, limits.failuresPerAddress, undefined, [404, 422]);
}

/** Slows down whoever tries links, and whoever guesses at the passphrase of an account that was invited. */
export function invitationLimits(limits: Limits): RequestHandler[] {
  const tokenOf = (request: Request) => String(request.params.token);
  return [tokenLimit(limits), failureLimit(limits.minutes, limits.failuresPerAccount, tokenOf, [422])];
}

/** Bounds the mail that somebody signed in can cause, whether it is refused or not. */
export function askLimit(limits: Limits): RequestHandler {
  return countLimit(limits.minutes, limits.failuresPerAddress, (request) => request.user?.id ?? 'nobody');
}

/** Bounds the mail that anybody can cause, from one address and to one address. */
export function resetLimits(limits: Limits): RequestHandler[] {
  return [
    countLimit(limits.minutes, limits.failuresPerAddress, undefined),
    countLimit(limits.minutes, limits.failuresPerAccount, accountOf),
  ];
}

function countLimit(
  minutes: number,
  limit: number,
  keyGenerator: ((request: Request) => string) | undefined,
): RequestHandler {
  return failureLimit(minutes, limit, keyGenerator, 'all');
}

function failureLimit(
  minutes: number,
  limit: number,
  keyGenerator: ((request: Request) => string) | undefined,
  /** Answers that count as failures; null: every refusal; all: whatever is answered. */
  failures: readonly number[] | null | 'all' = null,
): RequestHandler {
  return rateLimit({
    windowMs: minutes * 60_000,
    limit,
    skipSuccessfulRequests: failures !== 'all',
    ...(failures === null || failures === 'all'
      ? {}
      : { requestWasSuccessful: (_request, { statusCode }) => !failures.includes(statusCode) }),
    standardHeaders: 'draft-7',
    legacyHeaders: false,
    ...(keyGenerator ? { keyGenerator } : {}),
    handler: (_request, _response, next) =>
      next(
        new AppError(
          429,
          'too-many-attempts',
          `This was tried too often. Wait ${minutes} minutes and try again.`,
        ),
      ),
  });
}

function accountOf(request: Request): string {
  const body: unknown = request.body;
  const email = typeof body === 'object' && body !== null && 'email' in body ? body.email : '';
  return typeof email === 'string' ? email.trim().toLowerCase() : '';
}
