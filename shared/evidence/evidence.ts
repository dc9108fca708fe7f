/**
 * Evidence: everything a team has entered for one problem, as it was entered.
 * Schemas (parsed once at the edge) and the types derived from them; no rule and no computation lives here.
 */
import { z } from 'zod';

/** Identifier of any row: made by the server or, for trials, by the client. Never shown to people. */
export const idSchema = z.string().regex(/^[A-Za-z0-9-]{1,64}$/);

/** A number as it was typed, with its unit ('1' for a pure number) and, where given, its own u at k = 1 in that unit. */
export const readingSchema = z.object({
  text: z.string().min(1).max(40),
  unit: z.string().max(40),
  u: z.string().max(40).optional(),
});
export type Reading = z.infer<typeof readingSchema>;

/**
 * One stated part of an uncertainty. `amount` is in the given unit, except for `scale`, where it is relative ('0.01' is 1 %).
 * `shared: true` means one and the same error for every reading that uses the instrument (it never averages away).
 */
export const uncertaintyPartSchema = z.object({
  kind: z.enum(['resolution', 'offset', 'scale', 'stated']),
  /** resolution: the full step; offset, scale: half-width or u as `shape` says; stated: an entered Type B part. */
  amount: z.string().max(40),
  unit: z.string().max(40),
  /** 'normal' divides by `k`; rectangular by √3 (a resolution's step by √12), triangular by √6, arcsine by √2. */
  shape: z.enum(['normal', 'rectangular', 'triangular', 'arcsine']),
  k: z.number().positive().optional(),
  shared: z.boolean(),
  /** Degrees of freedom of the statement; absent means infinite. */
  degreesOfFreedom: z.number().positive().optional(),
  /** Not contained in the scatter of repeats: added even where repeats scatter more than this part. */
  notInScatter: z.boolean().optional(),
  reason: z.string().max(400).optional(),
});
export type UncertaintyPart = z.infer<typeof uncertaintyPartSchema>;

export const instrumentSchema = z.object({
  id: idSchema,
  name: z.string().min(1).max(80),
  note: z.string().max(400).optional(),
  parts: z.array(uncertaintyPartSchema).max(20),
});
export type Instrument = z.infer<typeof instrumentSchema>;

/** A condition on a setting, both ends included; an absent end is open. */
export const rangeSchema = z.object({
  quantity: idSchema,
  min: readingSchema.nullable(),
  max: readingSchema.nullable(),
});
export type Range = z.infer<typeof rangeSchema>;

/** Which trials are meant: all of the series and the trials named besides, then only those inside every range. */
export const selectionSchema = z.object({
  series: z.array(idSchema).max(50),
  plusTrials: z.array(idSchema).max(500),
  where: z.array(rangeSchema).max(20),
});
export type Selection = z.infer<typeof selectionSchema>;

export const statisticSchema = z.enum([
  'mean',
  'median',
  'standard deviation',
  'minimum',
  'maximum',
  'count',
  'slope',
]);
export type Statistic = z.infer<typeof statisticSchema>;

/** How a quantity comes by its value. Expressions name quantities by id in braces: `{q7}^2*{q2}`. */
export const quantityDefinitionSchema = z.discriminatedUnion('origin', [
  z.object({
    origin: z.literal('constant'),
    /** null: named, but not measured. */
    reading: readingSchema.nullable(),
    /** The instrument it was read with, if any: its parts apply. */
    instrument: idSchema.nullable().optional(),
    parts: z.array(uncertaintyPartSchema).max(20),
  }),
  z.object({ origin: z.literal('recorded'), instrument: idSchema.nullable() }),
  z.object({ origin: z.literal('derived'), expr: z.string().min(1).max(2000) }),
  z.object({
    origin: z.literal('summary'),
    of: idSchema,
    /** slope only: the quantity on the horizontal axis. */
    against: idSchema.optional(),
    stat: statisticSchema,
    where: selectionSchema,
    scatter: z.enum(['group', 'pooled']),
  }),
  z.object({ origin: z.literal('fitted'), comparison: idSchema }),
  /** Defined by an equation of a model; the value in use is that of the model named here. */
  z.object({ origin: z.literal('predicted'), model: idSchema }),
]);
export type QuantityDefinition = z.infer<typeof quantityDefinitionSchema>;

export const quantitySchema = z.object({
  id: idSchema,
  /** A letter or a Greek letter by name or sign, then an optional `_sub`; unique in the problem. */
  symbol: z.string().min(1).max(24),
  name: z.string().min(1).max(120),
  /** Display unit, e.g. 'cm', '°', 'm/s^2'; '1' for a pure number. */
  unit: z.string().max(40),
  status: z.enum(['measured', 'published', 'assumed', 'fitted', 'predicted']),
  /** How it is known, in words ("steel rule, every trial"), and where a published value comes from. */
  source: z.string().max(400).optional(),
  def: quantityDefinitionSchema,
});
export type Quantity = z.infer<typeof quantitySchema>;

export const seriesSchema = z.object({
  id: idSchema,
  letter: z.string().regex(/^[A-Z]{1,2}$/),
  name: z.string().max(120),
  rig: z.string().max(120).optional(),
  /** What is held fixed through the series. */
  held: z.record(idSchema, readingSchema),
  /** Quantities set from trial to trial; trials with equal settings form a group. */
  settings: z.array(idSchema).max(12),
  /** Quantities read in each trial. */
  readings: z.array(idSchema).max(12),
});
export type Series = z.infer<typeof seriesSchema>;

export const trialSchema = z.object({
  id: idSchema,
  /** Number within the series, given by the server: B12. Never used twice. */
  number: z.number().int().positive(),
  series: idSchema,
  /** Order in which trials of the problem were run. */
  order: z.number().int(),
  /** Name of the person who logged it. */
  by: z.string(),
  at: z.iso.datetime({ offset: true }),
  values: z.record(idSchema, readingSchema),
  note: z.string().max(1000).optional(),
  /** Left out by the team, with the reason; still shown. */
  excluded: z.object({ reason: z.string().min(1).max(400), by: z.string(), at: z.string() }).optional(),
  /** Taken back by who logged it (an undo); shown in the log only. */
  withdrawn: z.object({ by: z.string(), at: z.string() }).optional(),
});
export type Trial = z.infer<typeof trialSchema>;

export const modelSchema = z.object({
  id: idSchema,
  /** Models of a problem are numbered in the order they were stated; earlier ones stay. */
  n: z.number().int().positive(),
  name: z.string().max(120).optional(),
  equations: z
    .array(z.object({ defines: idSchema, expr: z.string().min(1).max(2000) }))
    .min(1)
    .max(40),
  /** The quantity that is set against trials. */
  output: idSchema,
  /** Trusted where: outside any of these ranges the model may not be used. */
  limits: z.array(rangeSchema.extend({ reason: z.string().max(400).optional() })).max(20),
  assumptions: z
    .array(
      z.object({
        text: z.string().min(1).max(400),
        /** The effect left out, and its estimated relative size as an expression, if one was given. */
        neglects: z.string().max(120).optional(),
        size: z.string().max(2000).optional(),
      }),
    )
    .max(40),
  at: z.string(),
  by: z.string(),
});
export type Model = z.infer<typeof modelSchema>;

export const comparisonSchema = z.object({
  id: idSchema,
  name: z.string().max(120),
  model: idSchema,
  selection: selectionSchema,
  /** Parameters to find; none means the model predicts with what is known already. */
  free: z
    .array(
      z.object({
        quantity: idSchema,
        start: readingSchema,
        min: readingSchema.nullable(),
        max: readingSchema.nullable(),
      }),
    )
    .max(8),
  weights: z.enum(['absolute', 'relative']),
});
export type Comparison = z.infer<typeof comparisonSchema>;

const pointSchema = z.record(idSchema, readingSchema);

/** What a live value, or one side of a claim, points at: ids only, never a number. */
export type ValueReference =
  | { kind: 'quantity'; quantity: string; series?: string | undefined }
  | { kind: 'mean'; quantity: string; series: string; at: Record<string, Reading> }
  | { kind: 'prediction'; model: string; quantity: string; series: string; at: Record<string, Reading> }
  | { kind: 'reading'; trial: string; quantity: string }
  | { kind: 'fit'; comparison: string; figure: FitFigure }
  | { kind: 'claim'; claim: string; figure: 'z' | 'difference' | 'k' }
  | {
      kind: 'count';
      of: 'trials' | 'kept' | 'excluded' | 'used';
      series?: string | undefined;
      comparison?: string | undefined;
    }
  | { kind: 'difference'; a: ValueReference; b: ValueReference };

export const fitFigureSchema = z.enum([
  'chi-squared',
  'degrees of freedom',
  'p-value',
  'reduced chi-squared',
  'AICc',
  'worst z',
]);
export type FitFigure = z.infer<typeof fitFigureSchema>;

export const valueReferenceSchema: z.ZodType<ValueReference> = z.lazy(() =>
  z.discriminatedUnion('kind', [
    /** A register value: the one value it has, or its value inside a series. */
    z.object({ kind: z.literal('quantity'), quantity: idSchema, series: idSchema.optional() }),
    /** Mean of a recorded or derived column over the kept trials of one setting of a series. */
    z.object({ kind: z.literal('mean'), quantity: idSchema, series: idSchema, at: pointSchema }),
    /** What a model predicts for a quantity at a setting of a series. */
    z.object({
      kind: z.literal('prediction'),
      model: idSchema,
      quantity: idSchema,
      series: idSchema,
      at: pointSchema,
    }),
    z.object({ kind: z.literal('reading'), trial: idSchema, quantity: idSchema }),
    z.object({ kind: z.literal('fit'), comparison: idSchema, figure: fitFigureSchema }),
    z.object({ kind: z.literal('claim'), claim: idSchema, figure: z.enum(['z', 'difference', 'k']) }),
    z.object({
      kind: z.literal('count'),
      of: z.enum(['trials', 'kept', 'excluded', 'used']),
      series: idSchema.optional(),
      comparison: idSchema.optional(),
    }),
    z.object({ kind: z.literal('difference'), a: valueReferenceSchema, b: valueReferenceSchema }),
  ]),
);

/** The test that decides a claim. */
export const claimTestSchema = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('equals'), measured: valueReferenceSchema, expected: valueReferenceSchema }),
  z.object({ kind: z.literal('model fits'), comparison: idSchema }),
  z.object({
    kind: z.literal('bound'),
    value: valueReferenceSchema,
    side: z.enum(['at most', 'at least']),
    limit: readingSchema,
  }),
]);
export type ClaimTest = z.infer<typeof claimTestSchema>;

export const claimSchema = z.object({
  id: idSchema,
  n: z.number().int().positive(),
  text: z.string().min(1).max(400),
  /** null: the test is not chosen yet, so the claim stands undecided. */
  test: claimTestSchema.nullable(),
  /** Why it stays open, in the team's words (shown while no test is chosen). */
  openBecause: z.string().max(400).optional(),
  /** The verb of the task it answers, if it was made from one. */
  task: idSchema.optional(),
  /** When the test and its margin were last set. */
  declaredAt: z.string(),
});
export type Claim = z.infer<typeof claimSchema>;

export const chartSchema = z.object({
  id: idSchema,
  n: z.number().int().positive(),
  comparison: idSchema,
  /** Horizontal axis: a setting of the compared trials. */
  x: idSchema,
  /** What the chart shows, in one sentence; empty: the computed sentence is used. */
  sentence: z.string().max(400),
});
export type Chart = z.infer<typeof chartSchema>;

export const problemSettingsSchema = z.object({
  /** k of every verdict and of every bar drawn as ± k u. */
  k: z.number().positive().max(10),
  rounding: z.enum(['two digits', 'one or two digits']),
  /** Confidence level of intervals and bands, 0 < level < 1. */
  level: z.number().gt(0).lt(1),
  paper: z.enum(['A4', 'Letter']),
});
export type ProblemSettings = z.infer<typeof problemSettingsSchema>;

/** The whole of a problem's evidence; `version` grows by one with every committed change. */
export const evidenceSchema = z.object({
  version: z.number().int().nonnegative(),
  settings: problemSettingsSchema,
  instruments: z.array(instrumentSchema),
  quantities: z.array(quantitySchema),
  series: z.array(seriesSchema),
  trials: z.array(trialSchema).max(10_000),
  models: z.array(modelSchema),
  comparisons: z.array(comparisonSchema),
  claims: z.array(claimSchema),
  charts: z.array(chartSchema),
});
export type Evidence = z.infer<typeof evidenceSchema>;
