import { z } from 'zod';
import { fightInputSchema, type FightInput, type KeptFight } from '#shared/contracts/fights.ts';

/** What the form holds: texts as they are typed, the moment in the reader's own time. */
export const fightForm = z.object({
  name: fightInputSchema.shape.name,
  at: z.string().min(1, 'Give the day and time of the fight.'),
  place: z.string().max(120, 'Use at most 120 characters.'),
  result: z.string().max(120, 'Use at most 120 characters.'),
  event: z.string(),
  stages: z
    .array(
      z.object({
        role: z.enum(['report', 'oppose', 'review']),
        problem: z.string().min(1, 'Choose the problem.'),
        against: z.string().max(80, 'Use at most 80 characters.'),
        person: z.string(),
      }),
    )
    .max(12, 'A fight has at most twelve stages.'),
});
export type FightFormValues = z.infer<typeof fightForm>;

export function toFormValues(fight: KeptFight | null): FightFormValues {
  return {
    name: fight?.name ?? '',
    at: fight ? localMoment(new Date(fight.at)) : '',
    place: fight?.place ?? '',
    result: fight?.result ?? '',
    event: fight?.event ?? '',
    stages: (fight?.stages ?? []).map(({ role, problem, against, person }) => ({
      role,
      problem: String(problem),
      against: against ?? '',
      person: person ?? '',
    })),
  };
}

export function toFightInput({ name, at, place, result, event, stages }: FightFormValues): FightInput {
  const given = (text: string) => (text.trim() === '' ? undefined : text.trim());
  return {
    name,
    at: new Date(at).toISOString(),
    place: given(place),
    result: given(result),
    event: given(event),
    stages: stages.map(({ role, problem, against, person }) => ({
      role,
      problem: Number(problem),
      against: given(against),
      person: given(person),
    })),
  };
}

/** As a field of day and time wants it: 2026-03-14T09:30. */
function localMoment(at: Date): string {
  const two = (part: number) => String(part).padStart(2, '0');
  return `${at.getFullYear()}-${two(at.getMonth() + 1)}-${two(at.getDate())}T${two(at.getHours())}:${two(at.getMinutes())}`;
}
