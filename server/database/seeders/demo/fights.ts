import exampleEvent from '#templates/events/example-a.json' with { type: 'json' };
import { eventSchema } from '#shared/talk/event.ts';
import type { Event } from '#shared/talk/event.ts';
import type { Fight } from '#shared/contracts/teams.ts';

const DAY = 86_400_000;

/** Half past nine on the day so many days from the first start. */
function morning(firstStart: Date, days: number): string {
  const day = new Date(firstStart.getTime() + days * DAY);
  return new Date(Date.UTC(day.getUTCFullYear(), day.getUTCMonth(), day.getUTCDate(), 9, 30)).toISOString();
}

export const DEMO_EVENT_ID = 'demo-event-a';

/** The event by whose settings the invented fights are held. */
export function demoEvent(): Event {
  return eventSchema.parse(exampleEvent);
}

/** The invented season: one fight over, the next in eleven days. */
export function demoFights(firstStart: Date): Fight[] {
  return [
    {
      id: 'demo-fight-1',
      name: 'Fight 1',
      at: morning(firstStart, -17),
      place: 'Skerry University, hall 2',
      result: '2nd of 3',
      stages: [
        { role: 'report', problem: 4, against: 'Gannet Bank', person: 'demo-maren' },
        { role: 'oppose', problem: 1, against: 'Cormorant Head', person: 'demo-kasimir' },
        { role: 'review', problem: 9, person: 'demo-petra' },
      ],
    },
    {
      id: 'demo-fight-2',
      name: 'Fight 2',
      at: morning(firstStart, 11),
      place: 'Gannet Bank, old boathouse',
      stages: [
        { role: 'report', problem: 1, against: 'Gannet Bank', person: 'demo-ines' },
        { role: 'oppose', problem: 6, against: 'Cormorant Head', person: 'demo-kasimir' },
        { role: 'review', problem: 4, person: 'demo-maren' },
      ],
    },
    { id: 'demo-fight-3', name: 'Fight 3', at: morning(firstStart, 46), stages: [] },
    { id: 'demo-final', name: 'Final', at: morning(firstStart, 81), stages: [] },
  ];
}

/** First and last day of the invented season. */
export function demoSeason(firstStart: Date): { readonly from: string; readonly to: string } {
  const day = (days: number) => new Date(firstStart.getTime() + days * DAY).toISOString().slice(0, 10);
  return { from: day(-61), to: day(89) };
}
