import { z } from 'zod';
import { idSchema } from '#shared/evidence/evidence.ts';
import { anchorSchema } from './anchor.ts';
import { atomNode } from './atom-node.ts';

/** Attributes of a claim in the report: which claim of the evidence. */
export const claimAttributes = z.object({ anchor: anchorSchema, claim: idSchema });
export type ClaimAttributes = z.infer<typeof claimAttributes>;

/** A claim with its verdict. */
export const ClaimBlock = atomNode({
  name: 'claim',
  inline: false,
  attributes: claimAttributes,
  fallback: { anchor: null, claim: null },
  text: () => '',
});
