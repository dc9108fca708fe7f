import type { Rational } from '#shared/numeric/rational.ts';
import type { Dimension } from '#shared/units/dimension.ts';
import type { FunctionName } from './functions.ts';

/** Half-open range of UTF-16 positions in the shown text. */
export interface Span {
  readonly from: number;
  readonly to: number;
}

/** A quantity that an expression may name. */
export interface NamedSymbol {
  readonly id: string;
  /** As the register has it: a letter or Greek letter by sign or name, then an optional `_sub`. */
  readonly symbol: string;
}

/** Signs that compare; `==` and `!=` are exact. */
export type ComparisonOperator = '<' | '<=' | '>' | '>=' | '==' | '!=';
/** Signs that compute, in the parser's usual order. */
export type BinaryOperator = '+' | '-' | '*' | '/' | '^';

/** One node of an expression; every node knows the piece of shown text it came from. */
export type ExpressionNode =
  /** A pure number; `exact` is the fraction it was typed as. */
  | {
      readonly kind: 'number';
      readonly text: string;
      readonly value: number;
      readonly exact: Rational;
      readonly span: Span;
    }
  /** A number with its unit; `value` is in SI. */
  | {
      readonly kind: 'measure';
      readonly text: string;
      readonly unit: string;
      readonly value: number;
      readonly dimension: Dimension;
      /** True for °C, which may be compared, added to and subtracted from, but not multiplied. */
      readonly affine: boolean;
      readonly span: Span;
    }
  | { readonly kind: 'symbol'; readonly id: string; readonly span: Span }
  | { readonly kind: 'pi'; readonly span: Span }
  | { readonly kind: 'negative'; readonly of: ExpressionNode; readonly span: Span }
  | {
      readonly kind: 'binary';
      readonly operator: BinaryOperator;
      readonly left: ExpressionNode;
      readonly right: ExpressionNode;
      readonly span: Span;
    }
  | {
      readonly kind: 'call';
      readonly name: FunctionName;
      readonly inputs: readonly ExpressionNode[];
      readonly span: Span;
    }
  /** `a < b <= c`: 1 when every neighbouring pair agrees, else 0. */
  | {
      readonly kind: 'comparison';
      readonly operators: readonly ComparisonOperator[];
      readonly terms: readonly ExpressionNode[];
      readonly span: Span;
    }
  /** `when ? then : otherwise`; `when` counts as met when it is not 0. */
  | {
      readonly kind: 'choice';
      readonly when: ExpressionNode;
      readonly then: ExpressionNode;
      readonly otherwise: ExpressionNode;
      readonly span: Span;
    };

/** A parsed expression. Plain data; equal text and register give an equal expression. */
export interface Expression {
  readonly root: ExpressionNode;
  /** The text with symbols, which spans refer to. */
  readonly shown: string;
  /** The text with `{id}` in place of symbols and every unit in brackets: what is kept. */
  readonly stored: string;
  /** Ids named, each once, in the order of their first place. */
  readonly inputs: readonly string[];
}

/** Why a text is no expression, or its units do not agree; the sentence says what to mend. */
export interface ExpressionFault {
  readonly code:
    'syntax' | 'ambiguous text' | 'unknown symbol' | 'unknown unit' | 'dimension mismatch' | 'source gone';
  readonly sentence: string;
  readonly span: Span;
  /** Texts to put in place of the span, best first. */
  readonly suggestions: readonly string[];
}

/** An expression, or the first fault of a text with the text as it is shown. */
export type ParseResult =
  | { readonly ok: true; readonly expression: Expression }
  | { readonly ok: false; readonly fault: ExpressionFault; readonly shown: string };

/** The dimension of an expression, or the first place where units do not agree. */
export type DimensionResult =
  | { readonly ok: true; readonly dimension: Dimension }
  | { readonly ok: false; readonly fault: ExpressionFault };
