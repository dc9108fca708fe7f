/** What a team enters about an event: its blocks, weights and rules. Nothing of it is fixed in the product. */
import { z } from 'zod';

/** What a team does in a stage. */
export const stageRoleSchema = z.enum(['report', 'oppose', 'review']);
export type StageRole = z.infer<typeof stageRoleSchema>;

/** Who has the floor in a block. */
export const floorSchema = z.enum(['reporter', 'opponent', 'reviewer', 'jury', 'nobody']);
export type Floor = z.infer<typeof floorSchema>;

/** A stretch of a stage, in minutes from the stage's beginning. */
export const eventBlockSchema = z
  .object({
    name: z.string().trim().min(1, 'Give the block a name.').max(80, 'Use at most 80 characters.'),
    floor: floorSchema,
    from: z.number().min(0, 'A stage begins at minute 0.').max(600),
    to: z.number().max(600, 'A stage lasts at most 600 minutes.'),
    /** The block in which the report is given; an event has one. */
    isReport: z.boolean(),
  })
  .refine(({ from, to }) => to > from, { path: ['to'], message: 'A block lasts longer than zero minutes.' });
export type EventBlock = z.infer<typeof eventBlockSchema>;

const weightSchema = z.number().min(0, 'A weight is not negative.').max(100);

/** The rules that differ from event to event. */
export const eventRulesSchema = z.object({
  /** How often one person may take the stage in a fight. */
  stagesPerPerson: z
    .number()
    .int('Use a whole number.')
    .min(1, 'A person takes the stage at least once.')
    .max(12),
  copiesEveningBefore: z.boolean(),
  copyCloses: z.enum(['stage ends', 'fight day ends']),
  opponentMayShowResults: z.boolean(),
  notesPassed: z.boolean(),
});
export type EventRules = z.infer<typeof eventRulesSchema>;

export const eventSchema = z
  .object({
    name: z.string().trim().min(1, 'Give the event a name.').max(80, 'Use at most 80 characters.'),
    /** Where it comes from, for an example of our own. */
    note: z.string().max(400),
    roles: z.array(stageRoleSchema).min(1, 'A stage needs at least one role.').max(3),
    blocks: z.array(eventBlockSchema).min(1, 'A stage needs at least one block.').max(40),
    weights: z.object({ report: weightSchema, oppose: weightSchema, review: weightSchema }),
    rules: eventRulesSchema,
  })
  .superRefine(({ roles, blocks }, context) => {
    if (new Set(roles).size < roles.length) {
      context.addIssue({ code: 'custom', path: ['roles'], message: 'Each role stands once in a stage.' });
    }
    if (blocks.filter(({ isReport }) => isReport).length !== 1) {
      context.addIssue({ code: 'custom', path: ['blocks'], message: 'Say which one block is the report.' });
    }
    const overlap = findOverlap(blocks);
    if (overlap) context.addIssue({ code: 'custom', path: ['blocks'], message: overlap });
  });
export type Event = z.infer<typeof eventSchema>;

function findOverlap(blocks: readonly EventBlock[]): string | null {
  const sorted = blocks.toSorted((a, b) => a.from - b.from);
  for (const [index, block] of sorted.entries()) {
    const before = sorted[index - 1];
    if (before && block.from < before.to) {
      return `“${before.name}” lasts to minute ${before.to}, but “${block.name}” begins at minute ${block.from}. Let one end before the next begins.`;
    }
  }
  return null;
}
