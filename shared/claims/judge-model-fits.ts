import type { Evidence } from '#shared/evidence/evidence.ts';
import { fault } from '#shared/evidence/fault.ts';
import type { ClaimFinding, ComparisonFinding, Findings } from '#shared/evidence/findings.ts';
import { counted, figureInWords, pValueInWords } from '#shared/evidence/words.ts';
import { FEWEST_TRIALS } from './judge-equals.ts';
import { tooFewTrials, undecided, withFault } from './undecided.ts';

/** A law holds while the p-value of its χ² lies between these; above, the uncertainties are too large to test it. */
const [LOWEST_P, HIGHEST_P] = [0.01, 0.99];

/**
 * A model against all trials of a comparison: holds when the chi-squared p-value lies within [0.01, 0.99]. Only
 * trials inside the model's trust count; the worst setting is told.
 */
export function judgeModelFits(
  blank: ClaimFinding,
  comparison: string,
  evidence: Evidence,
  findings: Findings,
): ClaimFinding {
  const finding = findings.comparisons.get(comparison);
  if (finding === undefined)
    return withFault(
      blank,
      fault('source gone', 'The comparison of this claim is gone. Choose another.', blank.id),
    );
  const worst = worstPoint(finding);
  const found: ClaimFinding = {
    ...blank,
    z: worst?.z ?? null,
    measured: worst?.measured ?? null,
    expected: worst?.predicted ?? null,
    difference: worst?.difference ?? null,
    trials: finding.used,
  };
  if (finding.fault !== undefined) return withFault(found, finding.fault);
  if (finding.used.length < FEWEST_TRIALS) {
    const { sentence, short } = tooFewTrials(finding.used.length, FEWEST_TRIALS);
    return undecided(found, sentence, short);
  }
  return decide(found, finding);
}

function decide(found: ClaimFinding, finding: ComparisonFinding): ClaimFinding {
  const { pValue, chiSquared, degreesOfFreedom, worstZ } = finding;
  if (pValue === null || chiSquared === null || degreesOfFreedom === null)
    return undecided(found, noTest(finding), 'no test possible');
  const trials = counted(finding.used.length, 'trial');
  const degrees = `${degreesOfFreedom} degree${degreesOfFreedom === 1 ? '' : 's'} of freedom`;
  const figures = `χ² is ${figureInWords(chiSquared)} for ${degrees} (${pValueInWords(pValue)}) over ${trials}`;
  if (pValue > HIGHEST_P)
    return undecided(
      found,
      `${figures}: the agreement is better than the uncertainties allow, so that they are too large to test the model. Find smaller ones.`,
      `${trials}, uncertainties too large`,
    );
  const worst = worstZ === null ? null : `${figureInWords(worstZ)}\u00a0u`;
  const told = worst === null ? '' : `; the worst setting misses by ${worst}`;
  return {
    ...found,
    verdict: pValue >= LOWEST_P ? 'Holds' : 'Leaks',
    sentence: `${figures}${told}; this claim holds while p lies between ${LOWEST_P} and ${HIGHEST_P}.`,
    short: worst === null ? trials : `${trials}, worst ${worst}`,
  };
}

function worstPoint({ points }: ComparisonFinding): ComparisonFinding['points'][number] | null {
  const judged = points.filter(({ z, trusted }) => trusted && z !== null);
  return judged.reduce<(typeof judged)[number] | null>(
    (worst, point) => (worst === null || Math.abs(point.z ?? 0) > Math.abs(worst.z ?? 0) ? point : worst),
    null,
  );
}

function noTest({ degreesOfFreedom }: ComparisonFinding): string {
  return degreesOfFreedom === 0
    ? 'There are as many free parameters as trials, so that the fit is no test. Log more trials.'
    : 'The trials carry no uncertainty of their own that could test the model. Give their readings one, and choose absolute weights.';
}
