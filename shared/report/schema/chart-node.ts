import { z } from 'zod';
import { idSchema } from '#shared/evidence/evidence.ts';
import { anchorSchema } from './anchor.ts';
import { atomNode } from './atom-node.ts';

/** Longest caption, in characters. */
export const MAX_CAPTION_LENGTH = 600;

/** Attributes of a chart: which chart of the evidence, and its caption. */
export const chartAttributes = z.object({
  anchor: anchorSchema,
  chart: idSchema,
  caption: z.string().max(MAX_CAPTION_LENGTH),
});
export type ChartAttributes = z.infer<typeof chartAttributes>;

/** A chart of the evidence with its caption. */
export const ChartBlock = atomNode({
  name: 'chart',
  inline: false,
  attributes: chartAttributes,
  fallback: { anchor: null, chart: null, caption: '' },
  text: (attrs) => attrs.caption,
});
