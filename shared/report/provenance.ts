/** Where a number comes from, as a worked sum: what it was made of, what that was made of in turn, down to the trials. */
import type { Evidence, ValueReference } from '#shared/evidence/evidence.ts';
import type { Findings, Hue, Scalar } from '#shared/evidence/findings.ts';
import { registerOf, seriesName } from '#shared/evidence/register.ts';
import { leftOutSentence } from './left-out.ts';
import { showValue, type Shown } from './live-value.ts';
import { provenanceFormula } from './provenance-formula.ts';
import { provenancePlot } from './provenance-plot.ts';
import { provenanceTerms } from './provenance-terms.ts';
import { shownUnit } from './shown-unit.ts';
import { valueQuantity } from './value-symbol.ts';

/** One line of the sum; its `terms` stand behind a brace. */
export interface ProvenanceTerm {
  /** "46.43", "± 0.38", "46.1"; empty where the words say all. */
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
  readonly points: readonly PlottedTrial[];
  readonly excluded: readonly PlottedTrial[];
  readonly value: number;
  readonly u: number | null;
  readonly predicted: number | null;
}

/** One trial on that scale. */
export interface PlottedTrial {
  readonly trial: string;
  /** "B12". */
  readonly label: string;
  readonly x: number;
}

/** Where the card leads on to. */
export type ProvenanceWay =
  | { readonly station: 'trials'; readonly series: string | null; readonly trial: string | null }
  | { readonly station: 'register'; readonly quantity: string }
  | { readonly station: 'model'; readonly model: string }
  | { readonly station: 'claims'; readonly claim: string };

/** A provenance card's content. */
export interface Provenance {
  readonly ref: ValueReference;
  readonly shown: Shown;
  /** "measured", "predicted by model 3", "fitted", "a difference". */
  readonly kind: string;
  /** LaTeX of the formula it was computed by; null: none. */
  readonly formula: string | null;
  readonly terms: readonly ProvenanceTerm[];
  readonly plot: ProvenancePlot | null;
  /** "Left out: B11, 43.5 cm, because the can slid back."; null: nothing is. */
  readonly leftOut: string | null;
  /** Sentences that a careful reader should see: the fit, the verdict, a warning, a fault. */
  readonly notes: readonly string[];
  readonly way: ProvenanceWay | null;
}

/**
 * The card of any value that is tied, or of a point on a chart.
 *
 * @param unit - unit it is shown in; null: the register's
 */
export function provenanceOf(
  ref: ValueReference,
  evidence: Evidence,
  findings: Findings,
  unit: string | null = null,
): Provenance {
  const shown = showValue(ref, 'value', unit, evidence, findings);
  const way = wayOn(ref, evidence);
  const { scalar } = shown;
  if (scalar === null) {
    const notes = shown.fault === null ? [] : [shown.fault.sentence];
    return {
      ref,
      shown,
      kind: kindOf(ref, null, evidence),
      formula: null,
      terms: [],
      plot: null,
      leftOut: null,
      notes,
      way,
    };
  }
  const chosen = shownUnit(ref, scalar, unit);
  const inUnit = typeof chosen === 'string' ? chosen : scalar.unit;
  return {
    ref,
    shown,
    kind: kindOf(ref, scalar, evidence),
    formula: provenanceFormula(ref, scalar, evidence),
    terms: provenanceTerms({ ref, scalar, unit: inUnit }, evidence, findings),
    plot: provenancePlot({ ref, scalar, unit: inUnit }, evidence, findings),
    leftOut: leftOutSentence(ref, scalar, inUnit, evidence, findings),
    notes: notesOf(ref, scalar, findings),
    way,
  };
}

function kindOf(ref: ValueReference, scalar: Scalar | null, evidence: Evidence): string {
  const register = registerOf(evidence);
  if (ref.kind === 'prediction') {
    const n = register.models.get(ref.model)?.n;
    return n === undefined ? 'predicted' : `predicted by model ${n}`;
  }
  if (ref.kind === 'count')
    return ref.series === undefined ? 'counted' : `counted in ${seriesName(register, ref.series)}`;
  if (ref.kind === 'fit') return register.comparisons.get(ref.comparison)?.name ?? 'a fit';
  if (ref.kind === 'claim') return `claim ${register.claims.get(ref.claim)?.n ?? ''}`.trim();
  if (scalar === null) return '';
  if (scalar.madeOf.kind === 'fit') return 'fitted';
  if (scalar.hue === 'difference') return 'a difference';
  return statusWords(ref, scalar, evidence);
}

function statusWords(ref: ValueReference, scalar: Scalar, evidence: Evidence): string {
  const row = registerOf(evidence).quantities.get(valueQuantity(ref) ?? '');
  const isEntered = scalar.madeOf.kind === 'entered' && ref.kind === 'quantity';
  if (isEntered && row !== undefined && row.status !== 'predicted') return row.status;
  return scalar.hue === 'measured' ? 'measured' : 'predicted';
}

function notesOf(ref: ValueReference, scalar: Scalar, findings: Findings): readonly string[] {
  const comparison =
    ref.kind === 'fit' ? ref.comparison : scalar.madeOf.kind === 'fit' ? scalar.madeOf.comparison : null;
  const fit = comparison === null ? undefined : findings.comparisons.get(comparison);
  const claim = ref.kind === 'claim' ? findings.claims.get(ref.claim) : undefined;
  const notes = [fit?.sentence, claim?.sentence, ...(fit?.warnings ?? []), ...scalar.warnings];
  return [...new Set(notes.filter((note): note is string => note !== undefined && note !== ''))];
}

function wayOn(ref: ValueReference, evidence: Evidence): ProvenanceWay | null {
  const register = registerOf(evidence);
  switch (ref.kind) {
    case 'mean':
      return { station: 'trials', series: ref.series, trial: null };
    case 'reading':
      return { station: 'trials', series: register.trials.get(ref.trial)?.series ?? null, trial: ref.trial };
    case 'prediction':
      return { station: 'model', model: ref.model };
    case 'fit': {
      const model = register.comparisons.get(ref.comparison)?.model;
      return model === undefined ? null : { station: 'model', model };
    }
    case 'claim':
      return { station: 'claims', claim: ref.claim };
    case 'count':
      return { station: 'trials', series: ref.series ?? null, trial: null };
    case 'difference':
      return wayOn(ref.b, evidence) ?? wayOn(ref.a, evidence);
    case 'quantity':
      return quantityWay(ref.quantity, evidence);
  }
}

function quantityWay(quantity: string, evidence: Evidence): ProvenanceWay | null {
  const register = registerOf(evidence);
  const row = register.quantities.get(quantity);
  if (row === undefined) return null;
  if (row.def.origin === 'predicted') return { station: 'model', model: row.def.model };
  if (row.def.origin === 'fitted') {
    const model = register.comparisons.get(row.def.comparison)?.model;
    if (model !== undefined) return { station: 'model', model };
  }
  return { station: 'register', quantity };
}
