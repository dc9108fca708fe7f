/** A claim as it stands in a report: number, sentence, verdict, and the line that says by what measure. */
import type { Evidence } from '#shared/evidence/evidence.ts';
import type { Findings, Verdict } from '#shared/evidence/findings.ts';

export interface ClaimLine {
  readonly n: number;
  readonly text: string;
  readonly verdict: Verdict;
  readonly why: string;
}

/** Null: the claim is gone. */
export function claimLine(_claim: string, _evidence: Evidence, _findings: Findings): ClaimLine | null {
  throw new Error('claimLine: not written');
}
