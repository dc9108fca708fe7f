/** How a live value reads: its text, its spoken name, its hue, or the fault that stands in its place. */
import type { Evidence, ValueReference } from '#shared/evidence/evidence.ts';
import type { Fault, Findings, Hue, Scalar } from '#shared/evidence/findings.ts';

/** The forms in which one value may stand in a sentence. */
export type LiveForm = 'value' | 'symbol and value' | 'concise' | 'number';

/** A value as it is shown. */
export interface Shown {
  /** Plain text: "46.4 ± 0.4 cm", "y = 12.0 ± 0.1 cm", "46.4(4) cm", "46.4"; the fault's words where there is no value. */
  readonly text: string;
  /** Symbol to typeset before the text, for the form that shows one. */
  readonly symbol: string | null;
  /** The text without its symbol: "12.0 ± 0.1 cm". */
  readonly value: string;
  /** For a screen reader: "46.4 plus or minus 0.4 centimetres, measured, 3 trials". */
  readonly spoken: string;
  readonly hue: Hue;
  readonly state: 'fresh' | 'fault';
  readonly fault: Fault | null;
  /** The number itself, SI; null on a fault. */
  readonly scalar: Scalar | null;
}

/**
 * Shows what a reference points at.
 *
 * @param unit - unit to show it in; null: the unit of the register
 */
export function showValue(
  _ref: ValueReference,
  _form: LiveForm,
  _unit: string | null,
  _evidence: Evidence,
  _findings: Findings,
): Shown {
  throw new Error('showValue: not written');
}
