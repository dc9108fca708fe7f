import type { Evidence, ValueReference } from '#shared/evidence/evidence.ts';
import type { Findings, Scalar } from '#shared/evidence/findings.ts';
import { registerOf, trialName } from '#shared/evidence/register.ts';
import { counted } from '#shared/evidence/words.ts';
import { readingText } from './reading-text.ts';
import { trialFigure } from './trial-figure.ts';
import { valueQuantity } from './value-symbol.ts';

/** Trials that are named with their reason; of more, only the count is told. */
const MOST_NAMED = 3;

/**
 * What a mean leaves out and why: "Left out: B11, 43.5 cm, because the can slid back."; null when it leaves out
 * nothing.
 */
export function leftOutSentence(
  ref: ValueReference,
  { madeOf }: Scalar,
  unit: string,
  evidence: Evidence,
  findings: Findings,
): string | null {
  if (madeOf.kind !== 'mean' || madeOf.leftOut.length === 0) return null;
  const register = registerOf(evidence);
  if (madeOf.leftOut.length > MOST_NAMED) {
    return `Left out: ${counted(madeOf.leftOut.length, 'trial')}, each with its reason among the trials.`;
  }
  const quantity = valueQuantity(ref) ?? '';
  const each = madeOf.leftOut.map((id) => {
    const figure = trialFigure(id, quantity, unit, evidence, findings);
    const value = figure === null ? '' : `, ${readingText({ text: figure.text, unit })}`;
    const reason = register.trials.get(id)?.excluded?.reason;
    return `${trialName(register, id)}${value}${reason === undefined ? '' : `, because ${asClause(reason)}`}`;
  });
  return `Left out: ${each.join('; ')}.`;
}

/**
 * A reason as the end of a sentence: without its full stop, and without a capital that only began a sentence.
 *
 * @example asClause('The can slid back.') // => 'the can slid back'
 * @example asClause('B. Farrow moved the tray') // => 'B. Farrow moved the tray'
 */
export function asClause(reason: string): string {
  const text = reason.trim().replace(/\.$/u, '');
  return /^(The|A|An|It|We|There|This|That|They|Its|Our|Someone|Nobody)\b/u.test(text)
    ? text.charAt(0).toLowerCase() + text.slice(1)
    : text;
}
