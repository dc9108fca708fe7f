import type { Evidence, ValueReference } from '#shared/evidence/evidence.ts';
import { findValue } from '#shared/evidence/find-value.ts';
import type { Findings, MadeOf, Scalar } from '#shared/evidence/findings.ts';
import { registerOf, trialName } from '#shared/evidence/register.ts';
import { isFault } from '#shared/evidence/fault.ts';
import { counted, countInWords } from '#shared/evidence/words.ts';
import { formatBare } from '#shared/formatting/format-scalar.ts';
import { differenceTerms } from './difference-terms.ts';
import { isFigure } from './figure-text.ts';
import { showValue } from './live-value.ts';
import type { ProvenanceTerm } from './provenance.ts';
import { trialFigure } from './trial-figure.ts';
import { uncertaintyTerm } from './uncertainty-term.ts';
import { valueQuantity, valueSymbol } from './value-symbol.ts';

/** A value that is taken apart, and the unit it is shown in. */
export interface Dissected {
  readonly ref: ValueReference;
  readonly scalar: Scalar;
  readonly unit: string;
}

/** Trials that are listed one by one; more are told as a range and a count. */
const MOST_TRIALS = 6;

/** How deep formulas inside formulas are followed on one card. */
const DEEPEST = 2;

/**
 * The lines of a value's sum: the value with what it was made of, its uncertainty with its parts. Figures have one
 * decimal more than the value itself is shown with.
 *
 * @param depth - how many formulas lie above this one
 */
export function provenanceTerms(
  dissected: Dissected,
  evidence: Evidence,
  findings: Findings,
  depth = 0,
): readonly ProvenanceTerm[] {
  const { ref, scalar, unit } = dissected;
  const { madeOf } = scalar;
  if (madeOf.kind === 'count') return countTerms(madeOf.trials, evidence);
  if (isFigure(ref)) return [];
  if (madeOf.kind === 'difference') return differenceTerms(dissected, madeOf.refs, evidence, findings);
  const value: ProvenanceTerm = {
    value: formatBare(scalar, unit, evidence.settings.rounding, scalar.u === null ? 0 : 1),
    symbol: null,
    words: wordsOf(madeOf, ref, evidence),
    hue: null,
    ref: null,
    terms: madeFrom(dissected, evidence, findings, depth),
  };
  return [value, ...uncertaintyTerm(scalar, unit, evidence, findings)];
}

function wordsOf(madeOf: MadeOf, ref: ValueReference, evidence: Evidence): string {
  switch (madeOf.kind) {
    case 'mean':
      return madeOf.trials.length === 1 ? 'one trial' : `mean of ${madeOf.trials.length}`;
    case 'summary':
      return `${madeOf.stat} of ${counted(madeOf.trials.length, 'trial')}`;
    case 'expression':
      return 'by the formula';
    case 'fit':
      return 'fitted';
    case 'difference':
    case 'count':
      return '';
    case 'entered':
      return enteredWords(ref, evidence);
  }
}

function enteredWords(ref: ValueReference, evidence: Evidence): string {
  const register = registerOf(evidence);
  if (ref.kind === 'reading') return trialName(register, ref.trial);
  if (ref.kind === 'quantity' && ref.series !== undefined) {
    const series = register.series.get(ref.series);
    if (series?.held[ref.quantity] !== undefined) return `held in series ${series.letter}`;
  }
  const source = register.quantities.get(valueQuantity(ref) ?? '')?.source;
  return source === undefined || source === '' ? 'as entered' : source;
}

function madeFrom(
  { ref, scalar, unit }: Dissected,
  evidence: Evidence,
  findings: Findings,
  depth: number,
): readonly ProvenanceTerm[] {
  const { madeOf } = scalar;
  const quantity = valueQuantity(ref);
  if (madeOf.kind === 'mean' || madeOf.kind === 'summary') {
    return quantity === null ? [] : trialTerms(madeOf.trials, quantity, unit, evidence, findings);
  }
  if (madeOf.kind !== 'expression') return [];
  return madeOf.refs.map((input) => inputTerm(input, evidence, findings, depth));
}

/** One line a trial, or a range and a count when there are many. */
function trialTerms(
  trials: readonly string[],
  quantity: string,
  unit: string,
  evidence: Evidence,
  findings: Findings,
): readonly ProvenanceTerm[] {
  const register = registerOf(evidence);
  const figures = trials.map((trial) => ({
    trial,
    figure: trialFigure(trial, quantity, unit, evidence, findings),
  }));
  if (figures.length > MOST_TRIALS) {
    const known = figures.filter(({ figure }) => figure !== null);
    const sorted = known.sort((a, b) => (a.figure?.value ?? 0) - (b.figure?.value ?? 0));
    const [low, high] = [sorted[0]?.figure?.text ?? '', sorted.at(-1)?.figure?.text ?? ''];
    return [line(`${low} to ${high}`, `${counted(trials.length, 'trial')}`)];
  }
  return figures.map(({ trial, figure }) => ({
    ...line(figure?.text ?? '', trialName(register, trial)),
    ref: { kind: 'reading', trial, quantity },
  }));
}

function inputTerm(
  ref: ValueReference,
  evidence: Evidence,
  findings: Findings,
  depth: number,
): ProvenanceTerm {
  const shown = showValue(ref, 'value', null, evidence, findings);
  const row = registerOf(evidence).quantities.get(valueQuantity(ref) ?? '');
  const found = findValue(findings, evidence, ref);
  const deeper =
    !isFault(found) && found.madeOf.kind === 'expression' && depth + 1 < DEEPEST
      ? found.madeOf.refs.map((input) => inputTerm(input, evidence, findings, depth + 1))
      : [];
  return {
    value: shown.text,
    symbol: valueSymbol(ref, evidence),
    words: row?.name ?? '',
    hue: shown.hue,
    ref,
    terms: deeper,
  };
}

function countTerms(trials: readonly string[], evidence: Evidence): readonly ProvenanceTerm[] {
  const register = registerOf(evidence);
  if (trials.length === 0) return [];
  const names = trials.map((trial) => trialName(register, trial));
  const words = names.length > MOST_TRIALS ? `${names[0] ?? ''} to ${names.at(-1) ?? ''}` : names.join(', ');
  return [line(countInWords(trials.length), words)];
}

function line(value: string, words: string): ProvenanceTerm {
  return { value, symbol: null, words, hue: null, ref: null, terms: [] };
}
