import { expect, test } from 'vitest';
import { eventSchema } from '#shared/talk/event.ts';
import { endOfStage, nextReportMinutes, reportMinutes, stageMinutes } from '#shared/talk/event-times.ts';
import exampleA from '#templates/events/example-a.json' with { type: 'json' };
import exampleB from '#templates/events/example-b.json' with { type: 'json' };

const A = eventSchema.parse(exampleA);
const B = eventSchema.parse(exampleB);

test.each([
  { event: A, roles: 3, minutes: 50, report: 12 },
  { event: B, roles: 2, minutes: 42, report: 10 },
])(
  'example, when it is read: $event.name has its roles and no gap in its minutes',
  ({ event, ...expected }) => {
    expect(event.roles).toHaveLength(expected.roles);
    expect(stageMinutes(event)).toBe(expected.minutes);
    expect(reportMinutes(event)).toBe(expected.report);
    expect(event.note).toContain('our own making');
    event.blocks.forEach((block, index) => expect(block.from).toBe(event.blocks[index - 1]?.to ?? 0));
  },
);

test('event, when a block lasts zero minutes: is refused in words', () => {
  const blocks = A.blocks.map((block) => (block.isReport ? { ...block, to: block.from } : block));
  const [issue] = eventSchema.safeParse({ ...A, blocks }).error?.issues ?? [];
  expect(issue?.message).toBe('A block lasts longer than zero minutes.');
});

test('event, when two blocks overlap: is refused and both are named', () => {
  const blocks = A.blocks.map((block) => (block.isReport ? { ...block, to: 18 } : block));
  const [issue] = eventSchema.safeParse({ ...A, blocks }).error?.issues ?? [];
  expect(issue?.message).toContain('“Report” lasts to minute 18, but “Questions of understanding” begins');
});

test('end of a stage, when it is the second: is two stages after the beginning', () => {
  expect(endOfStage({ at: '2026-03-14T09:30:00.000Z' }, A, 1)).toBe('2026-03-14T11:10:00.000Z');
});

test('next report, when a problem is reported later: is timed by that fight, and by none when it is past', () => {
  const stage = { role: 'report', problem: 1 };
  const fights = [
    { at: '2026-04-18T09:30:00.000Z', event: 'b', stages: [stage] },
    { at: '2026-02-14T09:30:00.000Z', event: 'a', stages: [stage] },
  ];
  const events = [
    { ...A, id: 'a' },
    { ...B, id: 'b' },
  ];
  expect(nextReportMinutes(fights, events, 1, new Date('2026-02-01'))).toBe(12);
  expect(nextReportMinutes(fights, events, 1, new Date('2026-03-01'))).toBe(10);
  expect(nextReportMinutes(fights, events, 1, new Date('2026-05-01'))).toBeNull();
  expect(nextReportMinutes(fights, events, 4, new Date('2026-02-01'))).toBeNull();
});
