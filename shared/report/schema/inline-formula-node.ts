import { z } from 'zod';
import { atomNode } from './atom-node.ts';

/** Longest typed formula, in characters. */
export const MAX_LATEX_LENGTH = 4000;

/** Attributes of a formula inside a sentence; empty while it is being written. */
export const inlineFormulaAttributes = z.object({ latex: z.string().max(MAX_LATEX_LENGTH) });
export type InlineFormulaAttributes = z.infer<typeof inlineFormulaAttributes>;

/** A typed formula inside a sentence. */
export const InlineFormula = atomNode({
  name: 'inlineFormula',
  inline: true,
  attributes: inlineFormulaAttributes,
  fallback: { latex: '' },
  text: (attrs) => attrs.latex,
});
