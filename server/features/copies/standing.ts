import type { CopyStanding } from '#shared/contracts/copies.ts';
import type { CopyModel } from './model.ts';

type Times = Pick<CopyModel, 'opensAt' | 'closesAt' | 'revokedAt'>;

/** How it stands with a copy at a moment. */
export function standingAt({ opensAt, closesAt, revokedAt }: Times, now: Date): CopyStanding {
  if (revokedAt !== null) return 'taken back';
  if (now.getTime() >= Date.parse(closesAt)) return 'ended';
  return now.getTime() < Date.parse(opensAt) ? 'waiting' : 'open';
}
