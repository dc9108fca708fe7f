import { z } from 'zod';
import { newProblemSchema, taskSchema, type Problem } from '#shared/contracts/teams.ts';
import type { NewProblem } from '../api/create-problem.ts';
import type { ProblemChange } from '../api/update-problem.ts';

const written = newProblemSchema.pick({ title: true, statement: true, owners: true }).extend({
  tasks: z.array(taskSchema.extend({ text: z.string().trim().max(400, 'At most 400 characters.') })).max(12),
});

/** The form of a new problem; questions left empty are dropped. */
export const newProblemForm = written.extend({
  number: z
    .string()
    .trim()
    .regex(/^[1-9]\d{0,2}$/, 'Use a whole number from 1 to 999.'),
});
export type NewProblemValues = z.infer<typeof newProblemForm>;

export function toNewProblem({ number, tasks, ...rest }: NewProblemValues): NewProblem {
  return {
    ...rest,
    number: Number(number),
    tasks: tasks.map(({ text }) => text).filter((text) => text !== ''),
  };
}

const NUMBER = /^\d+(?:[.,]\d+)?$/;
const numberOf = (text: string) => Number(text.trim().replace(',', '.'));

function numberField(sentence: string, isRight: (value: number) => boolean) {
  return z.string().refine((text) => NUMBER.test(text.trim()) && isRight(numberOf(text)), sentence);
}

/** The form of a problem's settings; numbers as they are typed. */
export const settingsForm = written.extend({
  k: numberField('Use a number above 0 and at most 10; 2 is usual.', (k) => k > 0 && k <= 10),
  level: numberField(
    'Use per cent, more than 0 and less than 100; 95 is usual.',
    (level) => level > 0 && level < 100,
  ),
  rounding: z.enum(['two digits', 'one or two digits']),
  paper: z.enum(['A4', 'Letter']),
});
export type SettingsValues = z.infer<typeof settingsForm>;

export function toSettingsValues({ title, statement, tasks, owners, settings }: Problem): SettingsValues {
  return {
    title,
    statement,
    tasks,
    owners: owners.map(({ id }) => id),
    k: String(settings.k),
    level: String(Number((settings.level * 100).toPrecision(12))),
    rounding: settings.rounding,
    paper: settings.paper,
  };
}

export function toProblemChange({
  k,
  level,
  rounding,
  paper,
  tasks,
  ...rest
}: SettingsValues): ProblemChange {
  return {
    ...rest,
    tasks: tasks.filter(({ text }) => text !== ''),
    settings: { k: numberOf(k), level: numberOf(level) / 100, rounding, paper },
  };
}
