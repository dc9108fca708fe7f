/** How evidence changes travel: one version step per committed batch, carrying the changed rows themselves. */
import { z } from 'zod';
import {
  chartSchema,
  claimSchema,
  comparisonSchema,
  instrumentSchema,
  modelSchema,
  problemSettingsSchema,
  quantitySchema,
  seriesSchema,
  trialSchema,
} from '#shared/evidence/evidence.ts';

/** One changed row: the whole new row, or null where it was removed. */
export const evidenceChangeSchema = z.discriminatedUnion('table', [
  z.object({ table: z.literal('settings'), row: problemSettingsSchema }),
  z.object({ table: z.literal('instruments'), id: z.string(), row: instrumentSchema.nullable() }),
  z.object({ table: z.literal('quantities'), id: z.string(), row: quantitySchema.nullable() }),
  z.object({ table: z.literal('series'), id: z.string(), row: seriesSchema.nullable() }),
  z.object({ table: z.literal('trials'), id: z.string(), row: trialSchema }),
  z.object({ table: z.literal('models'), id: z.string(), row: modelSchema.nullable() }),
  z.object({ table: z.literal('comparisons'), id: z.string(), row: comparisonSchema.nullable() }),
  z.object({ table: z.literal('claims'), id: z.string(), row: claimSchema.nullable() }),
  z.object({ table: z.literal('charts'), id: z.string(), row: chartSchema.nullable() }),
]);
export type EvidenceChange = z.infer<typeof evidenceChangeSchema>;

/** Answer of every write to evidence, and what every open tab is told. */
export const evidenceStepSchema = z.object({
  /** The version after this step; a client applies only its own version + 1 and fetches on a gap. */
  version: z.number().int(),
  changes: z.array(evidenceChangeSchema),
  /** Made by the client that asked for it, so that it knows its own echo. */
  mutationId: z.string(),
});
export type EvidenceStep = z.infer<typeof evidenceStepSchema>;

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
    what: z.enum(['team', 'problems', 'problem', 'report']),
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
