/**
 * What a reader of a lent copy may get, as schemas of exact objects: what is not named here cannot be sent.
 * No operator, note, account, rig, film, time of day, margin note, leak or level has a place in it.
 */
import { z } from 'zod';
import {
  chartSchema,
  comparisonSchema,
  claimSchema,
  instrumentSchema,
  modelSchema,
  problemSettingsSchema,
  quantitySchema,
  seriesSchema,
  trialSchema,
} from '#shared/evidence/evidence.ts';
import type { ReportDocument } from '#shared/report/schema/report-node.ts';
import { copyFindingsSchema } from './copy-findings.ts';

const daySchema = z.string().regex(/^\d{4}-\d{2}-\d{2}$/);

/** Evidence as far as the report reaches. */
export const copyEvidenceSchema = z.strictObject({
  version: z.number().int(),
  settings: problemSettingsSchema.strict(),
  instruments: z.array(instrumentSchema.pick({ id: true, name: true, parts: true }).strict()),
  quantities: z.array(quantitySchema.strict()),
  series: z.array(
    seriesSchema
      .pick({ id: true, letter: true, name: true, held: true, settings: true, readings: true })
      .strict(),
  ),
  trials: z.array(
    trialSchema
      .pick({ id: true, number: true, series: true, order: true, values: true })
      .extend({
        /** The day, without the time. */
        on: daySchema,
        excluded: z.strictObject({ reason: z.string() }).optional(),
      })
      .strict(),
  ),
  models: z.array(
    modelSchema
      .pick({ id: true, n: true, name: true, equations: true, output: true })
      .extend({ limits: z.array(modelSchema.shape.limits.element.omit({ reason: true }).strict()) })
      .strict(),
  ),
  comparisons: z.array(comparisonSchema.strict()),
  claims: z.array(claimSchema.pick({ id: true, n: true, text: true, test: true }).strict()),
  charts: z.array(chartSchema.strict()),
});
/** Evidence as far as the report reaches. */
export type CopyEvidence = z.infer<typeof copyEvidenceSchema>;

/** An edition as its reader gets it. */
export const copyViewSchema = z.strictObject({
  edition: z.strictObject({
    n: z.number().int(),
    seal: z.string(),
    /** When it was frozen. */
    at: z.string(),
    /** Version of the report's schema that the document follows. */
    reportSchema: z.number().int(),
  }),
  problem: z.strictObject({ number: z.number().int(), title: z.string(), statement: z.string() }),
  team: z.strictObject({ name: z.string(), university: z.string(), isDemo: z.boolean() }),
  /** Names that stand in the report's head. */
  authors: z.array(z.string()),
  advisors: z.array(z.string()),
  /** Trials that the report rests on. */
  trials: z.number().int(),
  evidence: copyEvidenceSchema,
  /** Checked against the report's own schema when the copy was made. */
  document: z.custom<ReportDocument>(
    (json) => typeof json === 'object' && json !== null && 'type' in json && json.type === 'doc',
  ),
  findings: copyFindingsSchema,
  /** Fingerprints of the report's pictures. */
  files: z.array(z.string().regex(/^[0-9a-f]{64}$/)),
});
/** An edition as its reader gets it. */
export type CopyView = z.infer<typeof copyViewSchema>;
