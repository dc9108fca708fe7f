import { z } from 'zod';
import { idSchema, readingSchema } from '#shared/evidence/evidence.ts';
import { anchorSchema } from './anchor.ts';
import { atomNode } from './atom-node.ts';
import { MAX_LATEX_LENGTH } from './inline-formula-node.ts';

/**
 * Attributes of a formula on its own line. A typed one has `latex`; an equation names a model and the quantity that
 * the equation defines, and its numbers are put in for one setting of one series.
 */
export const formulaAttributes = z.object({
  anchor: anchorSchema,
  kind: z.enum(['typed', 'equation']),
  latex: z.string().max(MAX_LATEX_LENGTH),
  model: idSchema.nullable(),
  /** Quantity whose equation is shown. */
  defines: idSchema.nullable(),
  series: idSchema.nullable(),
  /** Setting at which numbers are put in, by quantity. */
  at: z.record(idSchema, readingSchema),
  steps: z.enum(['symbols', 'numbers', 'numbers and result']),
  /** Short id by which the text can name the formula; it is numbered then. Null: not numbered. */
  label: anchorSchema.nullable(),
});
export type FormulaAttributes = z.infer<typeof formulaAttributes>;

/** A formula on its own line: typed, or an equation of a model in steps. */
export const Formula = atomNode({
  name: 'formula',
  inline: false,
  attributes: formulaAttributes,
  fallback: {
    anchor: null,
    kind: 'typed',
    latex: '',
    model: null,
    defines: null,
    series: null,
    at: {},
    steps: 'symbols',
    label: null,
  },
  text: (attrs) => attrs.latex,
});
