/** How a live value reads: its text, its spoken name, its hue, or the fault that stands in its place. */
import type { Evidence, ValueReference } from '#shared/evidence/evidence.ts';
import { isFault } from '#shared/evidence/fault.ts';
import { findValue } from '#shared/evidence/find-value.ts';
import type { Fault, Findings, Hue, Scalar } from '#shared/evidence/findings.ts';
import { formatBare, formatConcise, formatScalar } from '#shared/formatting/format-scalar.ts';
import { spokenScalar } from '#shared/formatting/spoken.ts';
import { symbolToSpeech, symbolToText } from '#shared/formatting/symbol.ts';
import { figureText, isFigure } from './figure-text.ts';
import { shownUnit } from './shown-unit.ts';
import { valueSymbol } from './value-symbol.ts';

/** The forms in which one value may stand in a sentence. */
export type LiveForm = 'value' | 'symbol and value' | 'concise' | 'number';

/** A value as it is shown. */
export interface Shown {
  /** Plain text: "46.4 ± 0.4 cm", "y = 12.0 ± 0.1 cm", "46.4(4) cm", "46.4"; a few words where there is no value. */
  readonly text: string;
  /** Symbol to typeset before the value, for the form that shows one; null: none. */
  readonly symbol: string | null;
  /** The text without its symbol: "12.0 ± 0.1 cm". */
  readonly value: string;
  /** For a screen reader: "46.4 plus or minus 0.4 centimetres, measured, 3 trials". */
  readonly spoken: string;
  readonly hue: Hue;
  readonly state: 'fresh' | 'fault';
  readonly fault: Fault | null;
  /** The number itself, SI; null on a fault. */
  readonly scalar: Scalar | null;
}

/**
 * Shows what a reference points at. A value that cannot be had is shown in words, with its fault.
 *
 * @param ref - what is tied
 * @param form - how it is written
 * @param unit - unit to show it in; null: the unit of the register
 * @param morePlaces - further decimal places, where a shown difference needs them
 */
export function showValue(
  ref: ValueReference,
  form: LiveForm,
  unit: string | null,
  evidence: Evidence,
  findings: Findings,
  morePlaces = 0,
): Shown {
  const found = findValue(findings, evidence, ref);
  const symbol = form === 'symbol and value' ? valueSymbol(ref, evidence) : null;
  if (isFault(found)) return showFault(found, ref, symbol);
  const chosen = shownUnit(ref, found, unit);
  if (typeof chosen !== 'string') return showFault(chosen, ref, symbol);
  const value = isFigure(ref)
    ? figureText(ref, found, form)
    : writeScalar(found, chosen, form, evidence, morePlaces);
  const named = symbol === null ? '' : `${symbolToText(symbol)}\u00A0=\u00A0`;
  return {
    text: named + value,
    symbol,
    value,
    spoken: spokenName(ref, found, chosen, symbol, evidence, morePlaces),
    hue: found.hue,
    state: 'fresh',
    fault: null,
    scalar: found,
  };
}

function writeScalar(
  scalar: Scalar,
  unit: string,
  form: LiveForm,
  evidence: Evidence,
  morePlaces: number,
): string {
  const rule = evidence.settings.rounding;
  if (form === 'concise') return formatConcise(scalar, unit, rule, morePlaces);
  if (form === 'number') return formatBare(scalar, unit, rule, morePlaces);
  return formatScalar(scalar, unit, rule, morePlaces);
}

function spokenName(
  ref: ValueReference,
  scalar: Scalar,
  unit: string,
  symbol: string | null,
  evidence: Evidence,
  morePlaces: number,
): string {
  if (isFigure(ref)) return figureText(ref, scalar, 'spoken');
  const named = symbol === null ? '' : `${symbolToSpeech(symbol)} equals `;
  return `${named}${spokenScalar(scalar, unit, evidence.settings.rounding, morePlaces)}, ${originWords(scalar)}`;
}

function originWords({ hue, madeOf }: Scalar): string {
  if (madeOf.kind === 'fit') return 'fitted';
  if (madeOf.kind === 'mean') {
    const n = madeOf.trials.length;
    return `measured, ${n} ${n === 1 ? 'trial' : 'trials'}`;
  }
  return hue === 'difference' ? 'a difference' : hue;
}

/** What stands in a sentence where a value cannot be had and was never shown. */
const FAULT_WORDS: Partial<Record<Fault['code'], string>> = {
  'source gone': 'source missing',
  'not measured': 'not measured',
  'no trials': 'no trials',
  'not determined': 'not determined',
  'not converged': 'not found',
};

function showFault(fault: Fault, ref: ValueReference, symbol: string | null): Shown {
  const value = FAULT_WORDS[fault.code] ?? 'no value';
  return {
    text: symbol === null ? value : `${symbolToText(symbol)}: ${value}`,
    symbol,
    value,
    spoken: `${symbol === null ? '' : `${symbolToSpeech(symbol)}, `}${value}. ${fault.sentence}`,
    hue: ref.kind === 'difference' ? 'difference' : ref.kind === 'prediction' ? 'predicted' : 'measured',
    state: 'fault',
    fault,
    scalar: null,
  };
}
