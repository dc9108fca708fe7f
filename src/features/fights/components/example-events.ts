import exampleA from '#templates/events/example-a.json';
import exampleB from '#templates/events/example-b.json';
import { eventSchema, type Event } from '#shared/talk/event.ts';

/** Two examples of our own making, to begin from. */
export const EXAMPLE_EVENTS: readonly Event[] = [exampleA, exampleB].map((example) =>
  eventSchema.parse(example),
);
