import type { Claim, Evidence } from '#shared/evidence/evidence.ts';
import type { Fields } from './fields.ts';
import { checkReading } from './numbers.ts';
import { checkReference, checkValueReference } from './references.ts';

export function checkClaim(claim: Claim, evidence: Evidence, fields: Fields): Claim {
  switch (claim.test?.kind) {
    case 'equals':
      checkValueReference(evidence, claim.test.measured, 'row.test.measured', fields);
      checkValueReference(evidence, claim.test.expected, 'row.test.expected', fields);
      break;
    case 'model fits':
      checkReference(evidence, 'comparisons', claim.test.comparison, 'row.test.comparison', fields);
      break;
    case 'bound':
      checkValueReference(evidence, claim.test.value, 'row.test.value', fields);
      checkReading(claim.test.limit, 'row.test.limit', fields);
      break;
    default:
  }
  return claim;
}
