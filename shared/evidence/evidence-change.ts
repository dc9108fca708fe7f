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
} from './evidence.ts';

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
