import type { ClaimTest, Evidence } from '#shared/evidence/evidence.ts';
import { fault as makeFault } from '#shared/evidence/fault.ts';
import { findValue } from '#shared/evidence/find-value.ts';
import type { ClaimFinding, Findings, Scalar } from '#shared/evidence/findings.ts';
import { modelName, registerOf } from '#shared/evidence/register.ts';
import { figureInWords, listInWords } from '#shared/evidence/words.ts';
import { formatValue } from '#shared/formatting/format-scalar.ts';
import { zOf } from '#shared/evidence/difference.ts';
import { brokenTrust } from './claim-place.ts';
import { trialsBehind } from './trials-behind.ts';
import { undecided, tooFewTrials, withFault } from './undecided.ts';

/** Kept trials that must stand behind a measured side. */
export const FEWEST_TRIALS = 3;

/**
 * A value against a prediction (or another value): holds while |z| ≤ k, with z the difference over its standard
 * uncertainty and what both sides share counted once. Undecided with fewer than three kept trials, without
 * uncertainty on either side, or outside trust.
 */
export function judgeEquals(
  blank: ClaimFinding,
  test: Extract<ClaimTest, { kind: 'equals' }>,
  evidence: Evidence,
  findings: Findings,
): ClaimFinding {
  const measured = findValue(findings, evidence, test.measured);
  if (measured.shape === 'fault') return withFault(blank, measured);
  const expected = findValue(findings, evidence, test.expected);
  if (expected.shape === 'fault') return withFault({ ...blank, measured }, expected);
  const difference = findValue(findings, evidence, {
    kind: 'difference',
    a: test.measured,
    b: test.expected,
  });
  if (difference.shape === 'fault') return withFault({ ...blank, measured, expected }, difference);
  const trials = trialsBehind(findings, evidence, test.measured);
  const z = zOf(difference);
  const found: ClaimFinding = { ...blank, measured, expected, difference, trials, z };
  const open = whyOpen(found, test, evidence, findings);
  if (open !== null) return undecided(found, open.sentence, open.short);
  if (z === null)
    return withFault(
      found,
      makeFault(
        'uncertainty not positive',
        'The difference has no uncertainty, so that it cannot be judged.',
        blank.id,
      ),
    );
  return decide(found, z, difference, evidence);
}

interface Open {
  readonly sentence: string;
  readonly short: string;
}

function whyOpen(
  { measured, expected, trials }: ClaimFinding,
  test: Extract<ClaimTest, { kind: 'equals' }>,
  evidence: Evidence,
  findings: Findings,
): Open | null {
  if (trials.length < FEWEST_TRIALS) return tooFewTrials(trials.length, FEWEST_TRIALS);
  if (measured?.u === null) return noUncertainty('measured');
  if (expected?.u === null) return noUncertainty('expected');
  const broken = brokenTrust(findings, evidence, test.measured, test.expected);
  if (broken === null) return null;
  const symbols = listInWords(broken.symbols);
  return {
    sentence: `${symbols} ${broken.symbols.length === 1 ? 'lies' : 'lie'} outside the range in which ${modelName(registerOf(evidence), broken.model)} is trusted, so that it says nothing here.`,
    short: 'outside trust',
  };
}

function noUncertainty(side: string): Open {
  return {
    sentence: `The ${side} side has no uncertainty, so that a difference means nothing.`,
    short: 'no uncertainty',
  };
}

function decide(found: ClaimFinding, z: number, difference: Scalar, evidence: Evidence): ClaimFinding {
  const { k, trials } = found;
  const size = figureInWords(Math.abs(z));
  const holds = Math.abs(z) <= k;
  const margin = `this claim holds at ${k}\u00a0u or less`;
  const gap = formatValue(
    { value: Math.abs(difference.value), u: difference.u },
    difference.unit,
    evidence.settings.rounding,
  );
  return {
    ...found,
    verdict: holds ? 'Holds' : 'Leaks',
    sentence: `Measured and predicted differ by ${size}\u00a0u; ${margin}.`,
    short: holds
      ? `${trials.length} trials, ${size}\u00a0u`
      : `measured ${gap} ${difference.value < 0 ? 'less' : 'more'}, ${size}\u00a0u`,
  };
}
