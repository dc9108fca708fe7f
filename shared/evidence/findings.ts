/**
 * Findings: every number, curve and verdict that evaluate() makes from evidence. Plain data, safe to post
 * between threads; all values in coherent SI unless a field says otherwise. Nothing here is ever stored as
 * truth: only an edition keeps findings, frozen beside their evidence.
 */
import type { Reading, ValueReference } from './evidence.ts';

/** Signed contribution of one independent source to a value, in the value's SI unit. */
export interface Part {
  readonly source: string;
  readonly c: number;
}

/** One number with its uncertainty; `parts` squared and summed give u². */
export interface Scalar {
  readonly shape: 'scalar';
  readonly value: number;
  /** Standard uncertainty, k = 1; null when nothing at all is known of it. */
  readonly u: number | null;
  readonly parts: readonly Part[];
  /** Effective degrees of freedom (Welch-Satterthwaite); Infinity when no part is limited. */
  readonly degreesOfFreedom: number;
  /** Unit it is shown in, as the register has it. */
  readonly unit: string;
  readonly hue: Hue;
  readonly madeOf: MadeOf;
  readonly warnings: readonly string[];
}

/** measured: water; predicted or fitted: copper; difference: leak; count: ink. */
export type Hue = 'measured' | 'predicted' | 'difference' | 'count';

/** One number for each trial of a series, in the order of `trials`. */
export interface Column {
  readonly shape: 'column';
  readonly trials: readonly string[];
  readonly values: Float64Array;
  /** Part of u that is independent from trial to trial, length n. */
  readonly own: Float64Array;
  /** Sensitivity to each shared source, length n each. */
  readonly shared: readonly { readonly source: string; readonly c: Float64Array }[];
  /** Share of `own` that the scatter of repeats does not contain, length n; absent when there is none. */
  readonly apart?: Float64Array | undefined;
  readonly unit: string;
  readonly hue: Hue;
  /** Trials that could not be read, each in one sentence; their value is NaN. */
  readonly warnings: readonly string[];
}

/** What stands in the place of a value that cannot be had. The sentence says what to mend and where. */
export interface Fault {
  readonly shape: 'fault';
  readonly code: FaultCode;
  readonly sentence: string;
  /** Id of the row that must be mended (a quantity, model, comparison, series, trial or claim). */
  readonly at: string;
  /** Set on a fault that was passed on from an input: the symbol of the quantity that has the fault itself. */
  readonly via?: string | undefined;
  /** Place in an expression's shown text, when the fault has one. */
  readonly span?: { readonly from: number; readonly to: number } | undefined;
}

export type FaultCode =
  | 'unknown unit'
  | 'unknown symbol'
  | 'ambiguous text'
  | 'syntax'
  | 'dimension mismatch'
  | 'cycle'
  | 'not measured'
  | 'no single value'
  | 'missing input'
  | 'not a number'
  | 'not finite'
  | 'no trials'
  | 'uncertainty not positive'
  | 'too few trials'
  | 'constant input'
  | 'not determined'
  | 'not converged'
  | 'source gone';

export type Finding = Scalar | Column | Fault;

/** Where a value comes from, one step down; the provenance card follows it further by key or trial. */
export type MadeOf =
  | { readonly kind: 'entered' }
  | {
      readonly kind: 'mean';
      readonly trials: readonly string[];
      readonly leftOut: readonly string[];
      /** s of the trials used (group or pooled), and which part of u it gave. */
      readonly scatter: number | null;
      readonly scatterKind: 'group' | 'pooled' | 'instrument';
    }
  | { readonly kind: 'summary'; readonly stat: string; readonly trials: readonly string[] }
  | {
      readonly kind: 'expression';
      readonly expr: string;
      /** Keys of the inputs, and what they point at, in the same order. */
      readonly inputs: readonly string[];
      readonly refs: readonly ValueReference[];
    }
  | { readonly kind: 'fit'; readonly comparison: string }
  | {
      readonly kind: 'difference';
      readonly a: string;
      readonly b: string;
      readonly refs: readonly [ValueReference, ValueReference];
    }
  | { readonly kind: 'count'; readonly trials: readonly string[] };

/** An independent source of uncertainty, in words for budgets and cards. */
export interface Source {
  readonly id: string;
  /** "steel rule, common to all", "scatter of the mean", "fit to series A". */
  readonly words: string;
  readonly kind: 'instrument' | 'constant' | 'reading' | 'scatter' | 'fit' | 'stated';
  readonly degreesOfFreedom: number;
  /** True when the same error enters several readings. */
  readonly shared: boolean;
}

/** Trials of one series that have equal settings. */
export interface Group {
  /** `series{setting=value}`: the mean of quantity q in this group has the key `q@` and then this. */
  readonly key: string;
  readonly series: string;
  readonly settings: Readonly<Record<string, Reading>>;
  /** SI values of the settings, by quantity. */
  readonly at: Readonly<Record<string, number>>;
  readonly kept: readonly string[];
  readonly excluded: readonly string[];
}

/** One setting (or one trial, where settings do not repeat) of a comparison. */
export interface ComparisonPoint {
  readonly trials: readonly string[];
  readonly settings: Readonly<Record<string, Reading>>;
  /** SI values of everything the model's inputs took there. */
  readonly at: Readonly<Record<string, number>>;
  readonly measured: Scalar;
  readonly predicted: Scalar | null;
  readonly difference: Scalar | null;
  /** Difference over its standard uncertainty, shared sources counted once; null when either side has no u. */
  readonly z: number | null;
  /** Inside every limit of the model. */
  readonly trusted: boolean;
  /** The model was fitted to these trials: z uses um² − up². */
  readonly fittedTo: boolean;
}

export interface FittedParameter {
  readonly quantity: string;
  readonly value: number;
  /** Statistical part from the fit alone, and the part from shared sources, both in SI. */
  readonly uFit: number;
  readonly uShared: number;
  readonly u: number;
  readonly atBound: boolean;
}

export interface ComparisonFinding {
  readonly id: string;
  readonly status: 'fitted' | 'predicted' | 'fault';
  readonly fault?: Fault | undefined;
  readonly parameters: readonly FittedParameter[];
  /** Parameters' statistical covariance, rows × columns, row-major; null when it could not be had. */
  readonly covariance: readonly number[] | null;
  readonly chiSquared: number | null;
  readonly degreesOfFreedom: number | null;
  readonly pValue: number | null;
  readonly aicc: number | null;
  readonly worstZ: number | null;
  /** Trials that entered, and trials of the selection that did not, each with the reason. */
  readonly used: readonly string[];
  readonly outside: readonly {
    readonly trial: string;
    readonly why: 'excluded' | 'outside trust' | 'incomplete';
  }[];
  readonly points: readonly ComparisonPoint[];
  /** One sentence each, in the words of a careful referee. */
  readonly warnings: readonly string[];
  /** "With C_v alone free, 10 of the 12 trials of series A give 0.967 ± 0.006; χ² is 3.8 for 9 degrees of freedom." */
  readonly sentence: string;
}

export type Verdict = 'Holds' | 'Leaks' | 'Undecided';

export interface ClaimFinding {
  readonly id: string;
  readonly verdict: Verdict;
  /** The reason in one sentence, with the margin: "Measured and predicted differ by 2.3 u; this claim holds at 2 u or less." */
  readonly sentence: string;
  /** The short form for lists: "10 trials, worst 0.5 u". */
  readonly short: string;
  readonly z: number | null;
  readonly k: number;
  readonly measured: Scalar | null;
  readonly expected: Scalar | null;
  readonly difference: Scalar | null;
  readonly trials: readonly string[];
  readonly fault?: Fault | undefined;
}

export interface ChartFinding {
  readonly id: string;
  readonly fault?: Fault | undefined;
  /** Quantity on each axis. */
  readonly x: string;
  readonly y: string;
  /** The predicted curve in SI: x, y and u of y, length n; `trusted` false outside the model's limits. */
  readonly curve: {
    readonly x: Float64Array;
    readonly y: Float64Array;
    readonly u: Float64Array;
    readonly trusted: Uint8Array;
  } | null;
  readonly points: readonly ComparisonPoint[];
  /** Excluded trials, drawn hollow: SI positions. */
  readonly excluded: readonly { readonly trial: string; readonly x: number; readonly y: number }[];
  /** The one sentence above the chart, computed. */
  readonly sentence: string;
}

export interface Findings {
  readonly version: number;
  /** Register values by key: `q`, and `q@series` where the value differs by series. For all else see findValue. */
  readonly values: ReadonlyMap<string, Finding>;
  readonly sources: ReadonlyMap<string, Source>;
  /** Groups of every series, in increasing order of their settings. */
  readonly groups: ReadonlyMap<string, readonly Group[]>;
  readonly comparisons: ReadonlyMap<string, ComparisonFinding>;
  readonly claims: ReadonlyMap<string, ClaimFinding>;
  readonly charts: ReadonlyMap<string, ChartFinding>;
  /** Trials of all series together; set only where some of the series are not there (a lent copy). */
  readonly counts?: Readonly<Record<'trials' | 'kept' | 'excluded', number>>;
}
