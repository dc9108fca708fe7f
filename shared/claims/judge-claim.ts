import type { Claim, Evidence } from '#shared/evidence/evidence.ts';
import type { ClaimFinding, Findings } from '#shared/evidence/findings.ts';
import { judgeBound } from './judge-bound.ts';
import { judgeEquals } from './judge-equals.ts';
import { judgeModelFits } from './judge-model-fits.ts';

/** What every test starts from: nothing known yet. */
export function blankVerdict({ id }: Claim, { settings }: Evidence): ClaimFinding {
  return {
    id,
    verdict: 'Undecided',
    sentence: '',
    short: '',
    z: null,
    k: settings.k,
    measured: null,
    expected: null,
    difference: null,
    trials: [],
  };
}

/** The verdict on a claim by its own test, with the sentence why; a claim whose test is not chosen is undecided. */
export function judgeClaim(claim: Claim, evidence: Evidence, findings: Findings): ClaimFinding {
  const blank = blankVerdict(claim, evidence);
  const { test } = claim;
  if (test === null) {
    const why = claim.openBecause ?? 'no test has been chosen for this claim yet';
    return { ...blank, sentence: asSentence(why), short: why };
  }
  switch (test.kind) {
    case 'equals':
      return judgeEquals(blank, test, evidence, findings);
    case 'model fits':
      return judgeModelFits(blank, test.comparison, evidence, findings);
    case 'bound':
      return judgeBound(blank, test, evidence, findings);
  }
}

function asSentence(text: string): string {
  const start = text.charAt(0).toUpperCase() + text.slice(1);
  return /[.?]$/u.test(start) ? start : `${start}.`;
}
