import type { FontStack } from '../fonts/font-stacks.ts';
import type { FormulaPart } from '../formulas/formula-layout.ts';

/** How text is set. Lengths in points. */
export interface TextStyle {
  readonly stack: FontStack;
  readonly size: number;
  readonly colour: string;
  /** How far the baseline is lifted: raised letters. */
  readonly rise?: number;
}

/** A structure element that holds the run apart from the sentence around it. */
export type RunElement =
  | { readonly tag: 'Link'; readonly href: string }
  | { readonly tag: 'Reference' }
  | { readonly tag: 'Formula'; readonly alt: string };

interface RunParts {
  readonly element?: RunElement | undefined;
  /** Drawn around the run: a number that is typed and not tied, or whose source is gone. */
  readonly dashed?: string | undefined;
  /** Colour of a hairline under the run: a link. */
  readonly underline?: string | undefined;
}

export interface TextRun extends RunParts {
  readonly kind: 'text';
  readonly text: string;
  readonly style: TextStyle;
  /** Never broken across lines: a number and its unit. */
  readonly whole?: boolean;
}

export interface FormulaRun extends RunParts {
  readonly kind: 'formula';
  readonly parts: readonly FormulaPart[];
  /** Size of the formula's em. */
  readonly size: number;
  readonly colour: string;
}

/** The line ends here. */
export interface BreakRun {
  readonly kind: 'break';
}

/** What a sentence is made of. */
export type InlineRun = TextRun | FormulaRun | BreakRun;
