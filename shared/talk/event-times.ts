import type { Event } from './event.ts';

type Timed = Pick<Event, 'blocks'>;

/**
 * Minutes that a stage of this event lasts.
 *
 * @example stageMinutes({ blocks: [{ name: 'Report', floor: 'reporter', from: 5, to: 17, isReport: true }] }) // => 17
 */
export function stageMinutes({ blocks }: Timed): number {
  return Math.max(0, ...blocks.map(({ to }) => to));
}

/**
 * Minutes that the report may take; null for an event without a block for it.
 *
 * @example reportMinutes({ blocks: [{ name: 'Report', floor: 'reporter', from: 5, to: 17, isReport: true }] }) // => 12
 */
export function reportMinutes({ blocks }: Timed): number | null {
  const report = blocks.find(({ isReport }) => isReport);
  return report ? report.to - report.from : null;
}

interface TimedFight {
  readonly at: string;
  readonly event?: string | undefined;
  readonly stages: readonly { readonly role: string; readonly problem: number }[];
}

/** When stage `index` (0 the first) of a fight ends; stages follow one another without a pause. */
export function endOfStage(fight: Pick<TimedFight, 'at'>, event: Timed, index: number): string {
  return new Date(Date.parse(fight.at) + (index + 1) * stageMinutes(event) * 60_000).toISOString();
}

/**
 * Minutes of the report in the first fight from `now` on in which the team reports this problem; null when there is
 * none, or when its event is not known.
 */
export function nextReportMinutes(
  fights: readonly TimedFight[],
  events: readonly (Timed & { readonly id: string })[],
  problem: number,
  now: Date,
): number | null {
  const fight = fights
    .filter(({ at }) => Date.parse(at) >= now.getTime())
    .toSorted((a, b) => Date.parse(a.at) - Date.parse(b.at))
    .find(({ stages }) => stages.some((stage) => stage.role === 'report' && stage.problem === problem));
  const event = events.find(({ id }) => id === fight?.event);
  return event ? reportMinutes(event) : null;
}
