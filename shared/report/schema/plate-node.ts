import { z } from 'zod';
import { anchorSchema } from './anchor.ts';
import { atomNode } from './atom-node.ts';
import { MAX_CAPTION_LENGTH } from './chart-node.ts';

/** Longest alternative text, in characters. */
export const MAX_ALT_LENGTH = 1000;

/** Attributes of a plate: the stored picture by its fingerprint, its size, its caption and its alternative text. */
export const plateAttributes = z.object({
  anchor: anchorSchema,
  /** SHA-256 of the stored picture, in hexadecimal. */
  sha: z.string().regex(/^[0-9a-f]{64}$/),
  width: z.number().int().min(1).max(1600),
  height: z.number().int().min(1).max(1600),
  caption: z.string().max(MAX_CAPTION_LENGTH),
  alt: z.string().max(MAX_ALT_LENGTH),
});
export type PlateAttributes = z.infer<typeof plateAttributes>;

/** A picture with its caption. */
export const Plate = atomNode({
  name: 'plate',
  inline: false,
  attributes: plateAttributes,
  fallback: { anchor: null, sha: null, width: null, height: null, caption: '', alt: '' },
  text: (attrs) => attrs.caption,
});
