/** A claim as it stands in a report: number, sentence, verdict, and the line that says by what measure. */
import type { Evidence } from '#shared/evidence/evidence.ts';
import type { Findings, Verdict } from '#shared/evidence/findings.ts';

/** What is shown of a claim. */
export interface ClaimLine {
  readonly n: number;
  readonly text: string;
  readonly verdict: Verdict;
  /** "Measured and predicted differ by 2.2 u; this claim holds at 2 u or less." */
  readonly why: string;
}

/** A claim's line; null when the claim is gone. */
export function claimLine(claim: string, evidence: Evidence, findings: Findings): ClaimLine | null {
  const row = evidence.claims.find(({ id }) => id === claim);
  if (row === undefined) return null;
  const finding = findings.claims.get(claim);
  return {
    n: row.n,
    text: row.text,
    verdict: finding?.verdict ?? 'Undecided',
    why: finding?.fault?.sentence ?? finding?.sentence ?? row.openBecause ?? '',
  };
}
