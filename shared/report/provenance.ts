/** Where a number comes from, as a worked sum: what it was made of, what it was made of in turn, down to the trials. */
import type { Evidence, ValueReference } from '#shared/evidence/evidence.ts';
import type { Findings, Hue } from '#shared/evidence/findings.ts';
import type { Shown } from './live-value.ts';

/** One line of the sum; its `terms` stand behind a brace. */
export interface ProvenanceTerm {
  /** "46.43", "± 0.38", "B10" stands in `words`. */
  readonly value: string;
  /** Symbol to typeset before the value; null: none. */
  readonly symbol: string | null;
  /** "mean of 3", "together", "B12", "ruler, common to all three". */
  readonly words: string;
  readonly hue: Hue | null;
  /** What this line points at, where it can be followed further. */
  readonly ref: ValueReference | null;
  readonly terms: readonly ProvenanceTerm[];
}

/** Trials of a mean on one scale, in the shown unit. */
export interface ProvenancePlot {
  readonly unit: string;
  readonly points: readonly { readonly trial: string; readonly label: string; readonly x: number }[];
  readonly excluded: readonly { readonly trial: string; readonly label: string; readonly x: number }[];
  readonly value: number;
  readonly u: number | null;
  readonly predicted: number | null;
}

/** Where the card leads on to. */
export type ProvenanceWay =
  | { readonly station: 'trials'; readonly series: string; readonly trial: string | null }
  | { readonly station: 'register'; readonly quantity: string }
  | { readonly station: 'model'; readonly model: string };

/** A provenance card's content. */
export interface Provenance {
  readonly ref: ValueReference;
  readonly shown: Shown;
  /** "measured", "predicted by model 3", "fitted to series A", "constant, steel rule". */
  readonly kind: string;
  /** LaTeX of the formula it was computed by; null: none. */
  readonly formula: string | null;
  readonly terms: readonly ProvenanceTerm[];
  readonly plot: ProvenancePlot | null;
  /** "Left out: B11, 43.5 cm, because the can slid back." */
  readonly leftOut: string | null;
  /** Sentences that a careful reader should see. */
  readonly warnings: readonly string[];
  readonly way: ProvenanceWay | null;
}

/** The card of any live value. */
export function provenanceOf(_ref: ValueReference, _evidence: Evidence, _findings: Findings): Provenance {
  throw new Error('provenanceOf: not written');
}
