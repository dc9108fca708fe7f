import type { Evidence } from '#shared/evidence/evidence.ts';
import { isFault } from '#shared/evidence/fault.ts';
import { findValue } from '#shared/evidence/find-value.ts';
import type { Findings } from '#shared/evidence/findings.ts';
import { registerOf } from '#shared/evidence/register.ts';
import { formatBare } from '#shared/formatting/format-scalar.ts';
import { parseUnit } from '#shared/units/parse-unit.ts';
import { fromSi } from '#shared/units/convert.ts';
import { readingFigures } from './reading-text.ts';

/** One trial's value of a quantity, in some unit: as it was typed where the unit is the same, else rounded. */
export interface TrialFigure {
  readonly text: string;
  readonly value: number;
}

/** Null: the trial has no such value. */
export function trialFigure(
  trial: string,
  quantity: string,
  unit: string,
  evidence: Evidence,
  findings: Findings,
): TrialFigure | null {
  const found = findValue(findings, evidence, { kind: 'reading', trial, quantity });
  const parsed = parseUnit(unit);
  if (isFault(found) || !parsed.ok) return null;
  const value = fromSi(found.value, parsed.unit);
  const typed = registerOf(evidence).trials.get(trial)?.values[quantity];
  const text =
    typed !== undefined && typed.unit === unit
      ? readingFigures(typed)
      : formatBare(found, unit, evidence.settings.rounding);
  return { text, value };
}
