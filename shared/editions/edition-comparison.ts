/** What moved between two frozen contents, or an edition and the draft, as plain data with its sentences. */
import { z } from 'zod';

/** One piece of a changed passage, in reading order. */
export const textPieceSchema = z.object({
  change: z.enum(['same', 'added', 'removed']),
  /** text: words; value: a tied number as it read then; formula: LaTeX; part: a chart, table, claim or plate, named. */
  kind: z.enum(['text', 'value', 'formula', 'part']),
  text: z.string(),
});
/** One piece of a changed passage. */
export type TextPiece = z.infer<typeof textPieceSchema>;

/** A passage of the report that is not in both, or not the same in both. */
export const movedPassageSchema = z.object({
  /** Number of its section, 1 to 5. */
  section: z.number().int(),
  change: z.enum(['added', 'removed', 'changed']),
  pieces: z.array(textPieceSchema),
});
/** A passage that moved. */
export type MovedPassage = z.infer<typeof movedPassageSchema>;

/** A number tied in both reports that reads otherwise now. */
export const movedValueSchema = z.object({
  key: z.string(),
  /** "range on the tray at 38°". */
  name: z.string(),
  hue: z.enum(['measured', 'predicted', 'difference', 'count']),
  before: z.string(),
  after: z.string(),
  /** Why, as far as the trials behind it tell: "B13 added"; empty where they do not. */
  why: z.string(),
  /** Section of the later report in which it first stands. */
  section: z.number().int(),
});
/** A number that moved. */
export type MovedValue = z.infer<typeof movedValueSchema>;

const verdictSchema = z.enum(['Holds', 'Leaks', 'Undecided']);

/** A claim whose verdict is another one. */
export const movedVerdictSchema = z.object({
  n: z.number().int(),
  text: z.string(),
  before: verdictSchema,
  after: verdictSchema,
  /** The later verdict's reason, short: "10 trials, worst 0.5 u". */
  short: z.string(),
});
/** A verdict that moved. */
export type MovedVerdict = z.infer<typeof movedVerdictSchema>;

/** All that moved. */
export const editionComparisonSchema = z.object({
  values: z.array(movedValueSchema),
  /** Values tied only in the later report, and only in the earlier one. */
  newlyTied: z.number().int(),
  noLongerTied: z.number().int(),
  verdicts: z.array(movedVerdictSchema),
  /** One sentence each: trials logged, left out, brought back, taken back, corrected. */
  trials: z.array(z.string()),
  /** One sentence each: definitions added, changed, removed. */
  definitions: z.array(z.string()),
  passages: z.array(movedPassageSchema),
});
/** All that moved between two contents. */
export type EditionComparison = z.infer<typeof editionComparisonSchema>;
