/** Frozen findings as a copy carries them: the JSON of findingsToJson, each kind of finding by its exact members. */
import { z } from 'zod';
import { idSchema, readingSchema, valueReferenceSchema } from '#shared/evidence/evidence.ts';

/** A number, or one that JSON has no figures for. */
const numberSchema = z.union([z.number(), z.strictObject({ notFinite: z.string() })]);
const listSchema = z.array(numberSchema);
const textsSchema = z.array(z.string());
const hueSchema = z.enum(['measured', 'predicted', 'difference', 'count']);
const byQuantity = <Value extends z.ZodType>(value: Value) => z.record(idSchema, value);

const madeOfSchema = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('entered') }),
  z.strictObject({
    kind: z.literal('mean'),
    trials: textsSchema,
    leftOut: textsSchema,
    scatter: numberSchema.nullable(),
    scatterKind: z.enum(['group', 'pooled', 'instrument']),
  }),
  z.strictObject({ kind: z.literal('summary'), stat: z.string(), trials: textsSchema }),
  z.strictObject({
    kind: z.literal('expression'),
    expr: z.string(),
    inputs: textsSchema,
    refs: z.array(valueReferenceSchema),
  }),
  z.strictObject({ kind: z.literal('fit'), comparison: z.string() }),
  z.strictObject({
    kind: z.literal('difference'),
    a: z.string(),
    b: z.string(),
    refs: z.tuple([valueReferenceSchema, valueReferenceSchema]),
  }),
  z.strictObject({ kind: z.literal('count'), trials: textsSchema }),
]);

const scalarSchema = z.strictObject({
  shape: z.literal('scalar'),
  value: numberSchema,
  u: numberSchema.nullable(),
  parts: z.array(z.strictObject({ source: z.string(), c: numberSchema })),
  degreesOfFreedom: numberSchema,
  unit: z.string(),
  hue: hueSchema,
  madeOf: madeOfSchema,
  warnings: textsSchema,
});

const columnSchema = z.strictObject({
  shape: z.literal('column'),
  trials: textsSchema,
  values: listSchema,
  own: listSchema,
  shared: z.array(z.strictObject({ source: z.string(), c: listSchema })),
  apart: listSchema.optional(),
  unit: z.string(),
  hue: hueSchema,
  warnings: textsSchema,
});

const faultSchema = z.strictObject({
  shape: z.literal('fault'),
  code: z.string(),
  sentence: z.string(),
  at: z.string(),
  via: z.string().optional(),
  span: z.strictObject({ from: z.number(), to: z.number() }).optional(),
});

const sourceSchema = z.strictObject({
  id: z.string(),
  words: z.string(),
  kind: z.enum(['instrument', 'constant', 'reading', 'scatter', 'fit', 'stated']),
  degreesOfFreedom: numberSchema,
  shared: z.boolean(),
});

const groupSchema = z.strictObject({
  key: z.string(),
  series: z.string(),
  settings: byQuantity(readingSchema),
  at: byQuantity(numberSchema),
  kept: textsSchema,
  excluded: textsSchema,
});

const pointSchema = z.strictObject({
  trials: textsSchema,
  settings: byQuantity(readingSchema),
  at: byQuantity(numberSchema),
  measured: scalarSchema,
  predicted: scalarSchema.nullable(),
  difference: scalarSchema.nullable(),
  z: numberSchema.nullable(),
  trusted: z.boolean(),
  fittedTo: z.boolean(),
});

const comparisonSchema = z.strictObject({
  id: z.string(),
  status: z.enum(['fitted', 'predicted', 'fault']),
  fault: faultSchema.optional(),
  parameters: z.array(
    z.strictObject({
      quantity: z.string(),
      value: numberSchema,
      uFit: numberSchema,
      uShared: numberSchema,
      u: numberSchema,
      atBound: z.boolean(),
    }),
  ),
  covariance: listSchema.nullable(),
  chiSquared: numberSchema.nullable(),
  degreesOfFreedom: numberSchema.nullable(),
  pValue: numberSchema.nullable(),
  aicc: numberSchema.nullable(),
  worstZ: numberSchema.nullable(),
  used: textsSchema,
  outside: z.array(
    z.strictObject({ trial: z.string(), why: z.enum(['excluded', 'outside trust', 'incomplete']) }),
  ),
  points: z.array(pointSchema),
  warnings: textsSchema,
  sentence: z.string(),
});

const claimSchema = z.strictObject({
  id: z.string(),
  verdict: z.enum(['Holds', 'Leaks', 'Undecided']),
  sentence: z.string(),
  short: z.string(),
  z: numberSchema.nullable(),
  k: numberSchema,
  measured: scalarSchema.nullable(),
  expected: scalarSchema.nullable(),
  difference: scalarSchema.nullable(),
  trials: textsSchema,
  fault: faultSchema.optional(),
});

const chartSchema = z.strictObject({
  id: z.string(),
  fault: faultSchema.optional(),
  x: z.string(),
  y: z.string(),
  curve: z
    .strictObject({ x: listSchema, y: listSchema, u: listSchema, trusted: z.array(z.number()) })
    .nullable(),
  points: z.array(pointSchema),
  excluded: z.array(z.strictObject({ trial: z.string(), x: numberSchema, y: numberSchema })),
  sentence: z.string(),
});

const byKey = <Value extends z.ZodType>(value: Value) => z.record(z.string(), value);

/** Findings of a copy. */
export const copyFindingsSchema = z.strictObject({
  version: z.number().int(),
  values: byKey(z.discriminatedUnion('shape', [scalarSchema, columnSchema, faultSchema])),
  sources: byKey(sourceSchema),
  groups: byKey(z.array(groupSchema)),
  comparisons: byKey(comparisonSchema),
  claims: byKey(claimSchema),
  charts: byKey(chartSchema),
  /** How many trials the whole edition has: a count over all series names none of those that are left out. */
  counts: z.strictObject({ trials: z.number().int(), kept: z.number().int(), excluded: z.number().int() }),
});
