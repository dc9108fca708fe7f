import type { Evidence } from '#shared/evidence/evidence.ts';
import type { Findings } from '#shared/evidence/findings.ts';
import type { ReportDocument } from '#shared/report/schema/report-node.ts';
import { compareDefinitions } from './compare-definitions.ts';
import { comparePassages } from './compare-passages.ts';
import { compareTrials } from './compare-trials.ts';
import { compareValues } from './compare-values.ts';
import { compareVerdicts } from './compare-verdicts.ts';
import type { EditionComparison } from './edition-comparison.ts';

/** One side of a comparison: an edition, or the draft as it stands. */
export interface ComparedSide {
  readonly evidence: Evidence;
  readonly document: ReportDocument;
  readonly findings: Findings;
}

/**
 * What moved from one state of a problem to another, in words and in numbers. Each side is read with its own evidence
 * and its own findings: nothing is computed again.
 *
 * @param before - the earlier side
 * @param after - the later side
 */
export function compareEditions(before: ComparedSide, after: ComparedSide): EditionComparison {
  return {
    ...compareValues(before, after),
    verdicts: compareVerdicts(before, after),
    trials: compareTrials(before.evidence, after.evidence),
    definitions: compareDefinitions(before.evidence, after.evidence),
    passages: comparePassages(before, after),
  };
}
