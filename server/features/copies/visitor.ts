import type { Request, Response } from 'express';
import { COPY_PATH } from '#shared/contracts/copies.ts';
import { PASS_MS, type PassKind } from './copy-passes.ts';
import type { CopyVisitor } from './find-copy.ts';

const COOKIES: Readonly<Record<PassKind, string>> = {
  opening: 'holdwater-copy',
  room: 'holdwater-room',
};

/** Who stands before the copy that a request names. */
export function visitorOf(request: Request): CopyVisitor {
  const cookies = request.cookies as Readonly<Record<string, unknown>>;
  const pass = (kind: PassKind) => {
    const value = cookies[COOKIES[kind]];
    return typeof value === 'string' ? { [kind]: value } : {};
  };
  return {
    token: String(request.params.token),
    userId: request.user?.id ?? null,
    passes: { ...pass('opening'), ...pass('room') },
  };
}

/** Hangs a pass on the browser, for the routes of this copy alone. */
export function keepPass(request: Request, response: Response, kind: PassKind, pass: string): void {
  response.cookie(COOKIES[kind], pass, {
    httpOnly: true,
    sameSite: 'strict',
    secure: request.secure,
    maxAge: PASS_MS,
    path: COPY_PATH.replace(':token', encodeURIComponent(String(request.params.token))),
  });
}
