import type { Fight } from '#shared/contracts/teams.ts';
import { daysBetween } from '#src/lib/dates/say-date.ts';

/** The first fight that is today or still to come; null after the last. */
export function nextFight(fights: readonly Fight[], now: Date): Fight | null {
  const coming = fights.filter(({ at }) => daysBetween(now, new Date(at)) >= 0);
  return coming.toSorted((a, b) => Date.parse(a.at) - Date.parse(b.at))[0] ?? null;
}
