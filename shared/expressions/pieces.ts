import type { ExpressionFault, ExpressionNode, Span } from './expression.ts';
import type { FunctionName } from './functions.ts';

/**
 * A text made plain for the parser: every operand is a name `t0`, `t1`, …, every function `f0`, `f1`, …, and every
 * product is written out, so that nothing is left to guess.
 */
export interface Pieces {
  readonly text: string;
  /** For each position of `text` where a piece begins, the place in the shown text. */
  readonly places: readonly { readonly at: number; readonly span: Span }[];
  readonly leaves: readonly ExpressionNode[];
  readonly calls: readonly { readonly name: FunctionName; readonly span: Span }[];
  /** Places of matching round brackets. */
  readonly brackets: readonly Span[];
  /** What to write in place of shown text to get the stored form, in increasing order. */
  readonly edits: readonly { readonly span: Span; readonly text: string }[];
}

/** The pieces of a text, or its first fault. */
export type PiecesResult =
  { readonly ok: true; readonly pieces: Pieces } | { readonly ok: false; readonly fault: ExpressionFault };
