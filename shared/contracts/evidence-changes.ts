/** How evidence changes travel: one version step per committed batch, carrying the changed rows themselves. */
import { z } from 'zod';
import { evidenceChangeSchema } from '#shared/evidence/evidence-change.ts';

export { evidenceChangeSchema, type EvidenceChange } from '#shared/evidence/evidence-change.ts';

/** Answer of every write to evidence, and what every open tab is told. */
export const evidenceStepSchema = z.object({
  /** The version after this step; a client applies only its own version + 1 and fetches on a gap. */
  version: z.number().int(),
  changes: z.array(evidenceChangeSchema),
  /** Made by the client that asked for it, so that it knows its own echo. */
  mutationId: z.string(),
});
export type EvidenceStep = z.infer<typeof evidenceStepSchema>;

/** What a `stale` event may name, each a query of the client's. */
export const STALE = [
  'team',
  'problems',
  'problem',
  'report',
  'notes',
  'editions',
  'copies',
  'leaks',
  'slides',
  'invitations',
  'fights',
  'events',
  'outbox',
] as const;
export type Stale = (typeof STALE)[number];

/** Messages on the event stream, one JSON object each. */
export const serverEventSchema = z.discriminatedUnion('type', [
  z.object({
    type: z.literal('evidence'),
    team: z.string(),
    number: z.number().int(),
    step: evidenceStepSchema,
  }),
  /** Who has this problem open, and where. */
  z.object({
    type: z.literal('here'),
    team: z.string(),
    number: z.number().int(),
    people: z.array(z.object({ name: z.string(), where: z.string() })),
  }),
  /** Something else of the team or the problem changed: ask again. */
  z.object({
    type: z.literal('stale'),
    what: z.enum(STALE),
    team: z.string(),
    number: z.number().int().optional(),
  }),
]);
export type ServerEvent = z.infer<typeof serverEventSchema>;

/** What a tab says on the event stream: which problem it has open, and where in it ("Comparison", "Trials"). */
export const clientEventSchema = z.discriminatedUnion('type', [
  z.object({
    type: z.literal('watch'),
    team: z.string(),
    number: z.number().int(),
    where: z.string().max(40),
  }),
  z.object({ type: z.literal('leave') }),
]);
export type ClientEvent = z.infer<typeof clientEventSchema>;
