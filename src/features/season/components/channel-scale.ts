import type { Team } from '#shared/contracts/teams.ts';

const WEEK_MS = 7 * 86_400_000;

export interface ChannelScale {
  /** Where a moment stands, kept inside the channel. */
  at(date: Date): number;
  readonly left: number;
  readonly right: number;
  /** Every week of the season. */
  readonly weeks: readonly number[];
  /** The first of each month that has room for its name, and the season's beginning. */
  readonly months: readonly { readonly x: number; readonly name: string }[];
}

/** A season laid along a channel of this width. */
export function channelScale(season: Team['season'], width: number): ChannelScale {
  const from = new Date(season.from);
  const to = new Date(season.to);
  const left = 10;
  const right = width - 10;
  const length = Math.max(1, to.getTime() - from.getTime());
  const at = (date: Date) => {
    const share = (date.getTime() - from.getTime()) / length;
    return left + Math.min(1, Math.max(0, share)) * (right - left);
  };
  const weeks: number[] = [];
  for (let time = from.getTime(); time <= to.getTime(); time += WEEK_MS) weeks.push(at(new Date(time)));
  const months = [from, ...firstsOfMonth(from, to)].map((date) => ({
    x: at(date),
    name: date.toLocaleDateString('en-GB', { month: 'long' }),
  }));
  return { at, left, right, weeks, months };
}

function firstsOfMonth(from: Date, to: Date): Date[] {
  const firsts: Date[] = [];
  for (let step = 1; ; step += 1) {
    const first = new Date(from.getFullYear(), from.getMonth() + step, 1);
    if (first >= to) return firsts;
    firsts.push(first);
  }
}
