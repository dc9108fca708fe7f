import type { Evidence, ValueReference } from '#shared/evidence/evidence.ts';
import { isFault } from '#shared/evidence/fault.ts';
import { findValue } from '#shared/evidence/find-value.ts';
import type { Findings } from '#shared/evidence/findings.ts';
import { registerOf, trialName } from '#shared/evidence/register.ts';
import { requireUnit } from '#shared/formatting/unit-text.ts';
import { fromSi, uncertaintyFromSi } from '#shared/units/convert.ts';
import { newestModelOf } from './newest-model.ts';
import type { PlottedTrial, ProvenancePlot } from './provenance.ts';
import type { Dissected } from './provenance-terms.ts';
import { trialFigure } from './trial-figure.ts';
import { valueQuantity } from './value-symbol.ts';

/** Trials behind a mean or a summary on one scale, with what is predicted there; null: no trials stand behind it. */
export function provenancePlot(
  { ref, scalar, unit }: Dissected,
  evidence: Evidence,
  findings: Findings,
): ProvenancePlot | null {
  const { madeOf } = scalar;
  const quantity = valueQuantity(ref);
  if (quantity === null || (madeOf.kind !== 'mean' && madeOf.kind !== 'summary')) return null;
  const plotted = (trials: readonly string[]): readonly PlottedTrial[] =>
    trials.flatMap((trial) => {
      const figure = trialFigure(trial, quantity, unit, evidence, findings);
      return figure === null
        ? []
        : [{ trial, label: trialName(registerOf(evidence), trial), x: figure.value }];
    });
  const points = plotted(madeOf.trials);
  const excluded = madeOf.kind === 'mean' ? plotted(madeOf.leftOut) : [];
  if (points.length + excluded.length < 2) return null;
  const known = requireUnit(unit);
  return {
    unit,
    points,
    excluded,
    value: fromSi(scalar.value, known),
    u: scalar.u === null ? null : uncertaintyFromSi(scalar.u, known),
    predicted: predictedBeside(ref, unit, evidence, findings),
  };
}

function predictedBeside(
  ref: ValueReference,
  unit: string,
  evidence: Evidence,
  findings: Findings,
): number | null {
  if (ref.kind !== 'mean') return null;
  const model = newestModelOf(ref.quantity, evidence);
  if (model === null) return null;
  const { quantity, series, at } = ref;
  const found = findValue(findings, evidence, { kind: 'prediction', model: model.id, quantity, series, at });
  return isFault(found) ? null : fromSi(found.value, requireUnit(unit));
}
