import { z } from 'zod';
import { valueReferenceSchema } from '#shared/evidence/evidence.ts';
import { atomNode } from './atom-node.ts';

/** Attributes of a number that follows the trials: what it points at and how it is written, never its value. */
export const liveValueAttributes = z.object({
  ref: valueReferenceSchema,
  form: z.enum(['value', 'symbol and value', 'concise', 'number']),
  /** Unit to show it in; null: the unit of the register. */
  unit: z.string().max(40).nullable(),
  /** How it last read, kept only to show it when its source is gone. */
  shown: z.string().max(120).nullable(),
});
export type LiveValueAttributes = z.infer<typeof liveValueAttributes>;

/** A tied number in the text. */
export const LiveValue = atomNode({
  name: 'liveValue',
  inline: true,
  attributes: liveValueAttributes,
  fallback: { ref: null, form: 'value', unit: null, shown: null },
  text: (attrs) => attrs.shown ?? '',
});
