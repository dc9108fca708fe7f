import { z } from 'zod';
import { eventSchema, floorSchema, stageRoleSchema, type Event } from '#shared/talk/event.ts';

const minuteText = z.string().regex(/^\d{1,3}([.,]\d)?$/, 'Write minutes, like 5 or 12.5.');

/** What the form holds: numbers as they are typed. */
export const eventForm = z.object({
  name: eventSchema.shape.name,
  note: eventSchema.shape.note,
  roles: z.array(stageRoleSchema).min(1, 'A stage needs at least one role.'),
  blocks: z
    .array(
      z.object({
        name: z.string().trim().min(1, 'Name it.').max(80),
        floor: floorSchema,
        from: minuteText,
        to: minuteText,
      }),
    )
    .min(1, 'A stage needs at least one block.'),
  /** Index of the block that is the report. */
  report: z.string(),
  weights: z.object({ report: minuteText, oppose: minuteText, review: minuteText }),
  stagesPerPerson: z.string().regex(/^[1-9]\d?$/, 'Write how often, like 1.'),
  copiesEveningBefore: z.boolean(),
  copyCloses: z.enum(['stage ends', 'fight day ends']),
  opponentMayShowResults: z.boolean(),
  notesPassed: z.boolean(),
});
export type EventFormValues = z.infer<typeof eventForm>;

export function toEventValues(event: Event): EventFormValues {
  const { weights, rules, blocks } = event;
  return {
    name: event.name,
    note: event.note,
    roles: [...event.roles],
    blocks: blocks.map(({ name, floor, from, to }) => ({ name, floor, from: String(from), to: String(to) })),
    report: String(blocks.findIndex(({ isReport }) => isReport)),
    weights: {
      report: String(weights.report),
      oppose: String(weights.oppose),
      review: String(weights.review),
    },
    ...rules,
    stagesPerPerson: String(rules.stagesPerPerson),
  };
}

/** The event, or the first rule of a stage that it breaks, as a sentence. */
export function toEvent(values: EventFormValues): { readonly event: Event } | { readonly sentence: string } {
  const number = (text: string) => Number(text.replace(',', '.'));
  const parsed = eventSchema.safeParse({
    name: values.name,
    note: values.note,
    roles: values.roles,
    blocks: values.blocks.map(({ name, floor, from, to }, index) => ({
      name,
      floor,
      from: number(from),
      to: number(to),
      isReport: String(index) === values.report,
    })),
    weights: {
      report: number(values.weights.report),
      oppose: number(values.weights.oppose),
      review: number(values.weights.review),
    },
    rules: {
      stagesPerPerson: Number(values.stagesPerPerson),
      copiesEveningBefore: values.copiesEveningBefore,
      copyCloses: values.copyCloses,
      opponentMayShowResults: values.opponentMayShowResults,
      notesPassed: values.notesPassed,
    },
  });
  if (parsed.success) return { event: parsed.data };
  const issue = parsed.error.issues[0];
  const block =
    issue?.path[0] === 'blocks' && typeof issue.path[1] === 'number'
      ? values.blocks[issue.path[1]]
      : undefined;
  return { sentence: `${block ? `“${block.name}”: ` : ''}${issue?.message ?? 'The event cannot be read.'}` };
}
