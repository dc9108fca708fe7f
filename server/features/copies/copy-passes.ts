import { createHmac, timingSafeEqual } from 'node:crypto';

/** What a reader has shown: the copy's passphrase, or the key of its room. */
export type PassKind = 'opening' | 'room';

/** Signed notes that a browser keeps in a cookie, so that a passphrase is asked for once and not kept by any page. */
export interface CopyPasses {
  issue(kind: PassKind, copyId: string): string;
  isValid(kind: PassKind, copyId: string, pass: string | undefined): boolean;
}

/** As long as a day of preparation. */
export const PASS_MS = 12 * 3_600_000;

/** Passes signed with a secret: each is good for one copy, one thing shown, and some hours. */
export function createCopyPasses(secret: string, now: () => Date): CopyPasses {
  const sign = (kind: PassKind, copyId: string, ends: string) =>
    createHmac('sha256', secret).update(`copy pass\n${kind}\n${copyId}\n${ends}`).digest();
  return {
    issue(kind, copyId) {
      const ends = String(now().getTime() + PASS_MS);
      return `${ends}.${sign(kind, copyId, ends).toString('base64url')}`;
    },
    isValid(kind, copyId, pass) {
      const [, ends, signature] = /^(\d{1,16})\.([\w-]{43})$/.exec(pass ?? '') ?? [];
      if (ends === undefined || signature === undefined || Number(ends) <= now().getTime()) return false;
      return timingSafeEqual(sign(kind, copyId, ends), Buffer.from(signature, 'base64url'));
    },
  };
}
