import type { Claim, ProblemSettings } from '#shared/evidence/evidence.ts';
import type { ClaimFinding } from '#shared/evidence/findings.ts';
import { formatValue } from '#shared/formatting/format-scalar.ts';

/**
 * What would turn a claim that sets one value against another: how far the measured side would have to go, its
 * uncertainty unchanged, for |z| to pass k. Null where the verdict does not hang on one difference alone.
 */
export function turningSentence(
  { test }: Claim,
  { verdict, z, k, measured, difference }: ClaimFinding,
  rounding: ProblemSettings['rounding'],
): string | null {
  if (test?.kind !== 'equals' || verdict === 'Undecided') return null;
  if (!measured || !difference?.u || z === null || z === 0) return null;
  const edge = Math.sign(difference.value) * k * difference.u;
  const turned = measured.value + edge - difference.value;
  const shown = formatValue({ value: turned, u: measured.u }, measured.unit, rounding);
  const went = turned > measured.value ? 'rose' : 'fell';
  return `It would ${verdict === 'Holds' ? 'leak' : 'hold'} if the measured value ${went} to ${shown}.`;
}
