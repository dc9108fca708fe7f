import type { Evidence, ValueReference } from '#shared/evidence/evidence.ts';
import { isFault } from '#shared/evidence/fault.ts';
import { findValue } from '#shared/evidence/find-value.ts';
import type { Findings, Scalar } from '#shared/evidence/findings.ts';
import { roundDifference } from '#shared/formatting/difference.ts';
import { formatRounded } from '#shared/formatting/format-scalar.ts';
import { requireUnit } from '#shared/formatting/unit-text.ts';
import { uncertaintyFromSi } from '#shared/units/convert.ts';
import type { Dissected } from './provenance-terms.ts';
import type { ProvenanceTerm } from './provenance.ts';
import { uncertaintyTerm } from './uncertainty-term.ts';

/**
 * A difference taken apart: both sides, one more decimal in all three when the shown figures would not subtract, and
 * the uncertainty with what both sides share counted once.
 */
export function differenceTerms(
  { scalar, unit }: Dissected,
  sides: readonly [ValueReference, ValueReference],
  evidence: Evidence,
  findings: Findings,
): readonly ProvenanceTerm[] {
  const [a, b] = [findValue(findings, evidence, sides[0]), findValue(findings, evidence, sides[1])];
  if (isFault(a) || isFault(b)) return [];
  const rule = evidence.settings.rounding;
  const rounded = roundDifference(inUnit(a, unit), inUnit(b, unit), inUnit(scalar, unit), rule);
  const side = (value: Scalar, ref: ValueReference, text: string): ProvenanceTerm => ({
    value: text,
    symbol: null,
    words: sideWords(value),
    hue: value.hue,
    ref,
    terms: [],
  });
  const whole: ProvenanceTerm = {
    value: formatRounded(rounded.difference, unit),
    symbol: null,
    words: 'difference',
    hue: null,
    ref: null,
    terms: [
      side(a, sides[0], formatRounded(rounded.a, unit)),
      side(b, sides[1], `−\u00A0${formatRounded(rounded.b, unit)}`),
    ],
  };
  return [whole, ...uncertaintyTerm(scalar, unit, evidence, findings)];
}

/** Only the distance matters, so the zero of a unit like °C plays no part. */
function inUnit({ value, u }: Scalar, unit: string): { value: number; u: number | null } {
  const known = requireUnit(unit);
  return {
    value: uncertaintyFromSi(value, known),
    u: u === null ? null : uncertaintyFromSi(u, known),
  };
}

function sideWords({ hue, madeOf }: Scalar): string {
  if (madeOf.kind === 'mean')
    return madeOf.trials.length === 1 ? 'measured once' : `mean of ${madeOf.trials.length}`;
  if (madeOf.kind === 'fit') return 'fitted';
  return hue === 'predicted' ? 'predicted' : 'measured';
}
