import type { Evidence, ValueReference } from './evidence.ts';
import type { Fault, Findings, Scalar } from './findings.ts';

/**
 * The value that a reference points at, or the fault that stands in its place. Means, predictions at a setting,
 * single readings and differences are made on the spot from the findings, differences by their parts, so that
 * shared sources cancel.
 */
export function findValue(_findings: Findings, _evidence: Evidence, _ref: ValueReference): Scalar | Fault {
  throw new Error('findValue: body follows');
}
