import type { Level } from '#shared/contracts/teams.ts';

const SHARES: Readonly<Record<Level, number>> = {
  Blank: 0,
  Sketched: 0.25,
  Drafted: 0.5,
  Tied: 0.75,
  Held: 1,
};

/** How full a section's vessel stands, 0 to 1. */
export function levelShare(level: Level): number {
  return SHARES[level];
}
