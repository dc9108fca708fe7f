import type { Evidence, FitFigure, ValueReference } from '#shared/evidence/evidence.ts';
import { registerOf, seriesName, trialName, type Register } from '#shared/evidence/register.ts';
import { settingWords } from '#shared/report/setting-words.ts';

const FIT_WORDS: Readonly<Record<FitFigure, string>> = {
  'chi-squared': 'χ²',
  'degrees of freedom': 'degrees of freedom',
  'p-value': 'p',
  'reduced chi-squared': 'χ² per degree of freedom',
  AICc: 'AICc',
  'worst z': 'largest difference in u',
};

const CLAIM_WORDS = { z: 'difference in u', difference: 'difference', k: 'margin in u' } as const;

/**
 * What a reference points at, named in a few words: "range on the tray at 38°", "predicted range on the tray at 38°",
 * "χ² of the upright can".
 */
export function valueWords(ref: ValueReference, evidence: Evidence): string {
  const register = registerOf(evidence);
  switch (ref.kind) {
    case 'quantity':
      return quantityName(ref.quantity, register);
    case 'mean':
      return quantityName(ref.quantity, register) + where(ref.at, evidence);
    case 'prediction':
      return `predicted ${quantityName(ref.quantity, register)}${where(ref.at, evidence)}`;
    case 'reading':
      return `${quantityName(ref.quantity, register)} in ${trialName(register, ref.trial)}`;
    case 'fit':
      return `${FIT_WORDS[ref.figure]} of ${comparisonName(ref.comparison, register)}`;
    case 'claim':
      return `${CLAIM_WORDS[ref.figure]} of ${claimName(ref.claim, register)}`;
    case 'count':
      return countWords(ref, register);
    case 'difference':
      return differenceWords(ref.a, ref.b, evidence);
  }
}

function quantityName(id: string, register: Register): string {
  return register.quantities.get(id)?.name ?? 'a quantity that is gone';
}

function where(at: Extract<ValueReference, { kind: 'mean' }>['at'], evidence: Evidence): string {
  const words = settingWords(at, evidence);
  return words === '' ? '' : ` at ${words}`;
}

function comparisonName(id: string, register: Register): string {
  const comparison = register.comparisons.get(id);
  return comparison === undefined ? 'a comparison that is gone' : `“${comparison.name}”`;
}

function claimName(id: string, register: Register): string {
  const claim = register.claims.get(id);
  return claim === undefined ? 'a claim that is gone' : `claim ${claim.n}`;
}

function countWords(ref: Extract<ValueReference, { kind: 'count' }>, register: Register): string {
  const which = {
    trials: 'number of trials',
    kept: 'number of kept trials',
    excluded: 'number of excluded trials',
    used: 'number of trials used',
  };
  if (ref.comparison !== undefined) return `${which[ref.of]} of ${comparisonName(ref.comparison, register)}`;
  return ref.series === undefined ? which[ref.of] : `${which[ref.of]} of ${seriesName(register, ref.series)}`;
}

/** A prediction and a mean of one quantity at one setting are named once. */
function differenceWords(a: ValueReference, b: ValueReference, evidence: Evidence): string {
  const [first, second] = [valueWords(a, evidence), valueWords(b, evidence)];
  if (first === `predicted ${second}`) return `predicted less measured ${second}`;
  if (second === `predicted ${first}`) return `measured less predicted ${first}`;
  return `${first} less ${second}`;
}
