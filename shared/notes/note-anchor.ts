import { z } from 'zod';
import { anchorSchema } from '#shared/report/schema/anchor.ts';

/** Longest text that one note may be about, and how much of what stands around it is kept. */
export const MAX_QUOTE = 400;
export const CONTEXT_LENGTH = 48;

/** A position that survives edits by others: an encoded relative position of the co-edited text, in base64. */
const positionSchema = z
  .string()
  .max(240)
  .regex(/^[A-Za-z0-9+/]+={0,2}$/);
const contextSchema = z.string().max(CONTEXT_LENGTH);

/** Where a note about words stands: two positions, and the words with what was around them when it was last placed. */
export const textPlaceSchema = z.object({
  from: positionSchema,
  to: positionSchema,
  before: contextSchema,
  after: contextSchema,
});
export type TextPlace = z.infer<typeof textPlaceSchema>;

export const textAnchorSchema = textPlaceSchema.extend({
  kind: z.literal('text'),
  /** The words when the note was written, an atom as one object sign; never changed afterwards. */
  quote: z.string().min(1).max(MAX_QUOTE),
  /** The same as it read to the advisor, numbers and formulas included. */
  said: z.string().trim().min(1).max(MAX_QUOTE),
});
export type TextAnchor = z.infer<typeof textAnchorSchema>;

export const blockAnchorSchema = z.object({
  kind: z.literal('block'),
  /** Anchor of a formula, chart, table, claim or plate. */
  block: anchorSchema,
  /** "Formula 3", as it was numbered when the note was written. */
  said: z.string().trim().min(1).max(MAX_QUOTE),
});

/** What a margin note is about. */
export const noteAnchorSchema = z.discriminatedUnion('kind', [textAnchorSchema, blockAnchorSchema]);
export type NoteAnchor = z.infer<typeof noteAnchorSchema>;
