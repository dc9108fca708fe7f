import type { Fight } from '#shared/contracts/teams.ts';
import { nextFight } from '#src/lib/team/next-fight.ts';

/** An hour of the day by which the stages of a fight are over. */
const AFTER_THE_STAGE = 20;
const WEEK = 7 * 86_400_000;

/** Value of a datetime-local field. */
export function toLocal(date: Date): string {
  const two = (n: number) => String(n).padStart(2, '0');
  return `${date.getFullYear()}-${two(date.getMonth() + 1)}-${two(date.getDate())}T${two(date.getHours())}:${two(date.getMinutes())}`;
}

/** To whom a problem is lent, and until when, unless the captain says otherwise: the next fight it is reported in. */
export function lendDefaults(
  fights: readonly Fight[],
  problem: number,
  now: Date,
): { readonly recipient: string; readonly until: Date; readonly fight: string | null } {
  const reports = fights.filter(({ stages }) =>
    stages.some((stage) => stage.role === 'report' && stage.problem === problem),
  );
  const fight = nextFight(reports, now) ?? nextFight(fights, now);
  const stage = fight?.stages.find((one) => one.role === 'report' && one.problem === problem);
  if (!fight) return { recipient: '', until: new Date(now.getTime() + WEEK), fight: null };
  const until = new Date(fight.at);
  until.setHours(AFTER_THE_STAGE, 0, 0, 0);
  if (until <= now)
    return { recipient: stage?.against ?? '', until: new Date(now.getTime() + WEEK), fight: null };
  return { recipient: stage?.against ?? '', until, fight: fight.name };
}
