import { z } from 'zod';
import { idSchema } from '#shared/evidence/evidence.ts';
import { anchorSchema } from './anchor.ts';
import { atomNode } from './atom-node.ts';
import { MAX_CAPTION_LENGTH } from './chart-node.ts';

/** Attributes of a trials table: which series, and its caption. */
export const trialsTableAttributes = z.object({
  anchor: anchorSchema,
  series: idSchema,
  caption: z.string().max(MAX_CAPTION_LENGTH),
});
export type TrialsTableAttributes = z.infer<typeof trialsTableAttributes>;

/** The trials of one series as a table. */
export const TrialsTable = atomNode({
  name: 'trialsTable',
  inline: false,
  attributes: trialsTableAttributes,
  fallback: { anchor: null, series: null, caption: '' },
  text: (attrs) => attrs.caption,
});
