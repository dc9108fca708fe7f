import type { Evidence, Reading, ValueReference } from '#shared/evidence/evidence.ts';
import { findingsValues } from '#shared/evidence/findings-values.ts';
import type { Findings } from '#shared/evidence/findings.ts';
import { brokenLimitsAt } from '#shared/evidence/predict.ts';

/** Where the two sides of a claim stand: the settings they name, and the model behind the expected side. */
interface ClaimPlace {
  readonly model: string | null;
  readonly series: string | null;
  readonly at: Readonly<Record<string, Reading>>;
}

/** Symbols of the limits that a claim's setting breaks, with the model whose limits they are. */
export function brokenTrust(
  findings: Findings,
  evidence: Evidence,
  measured: ValueReference,
  expected: ValueReference,
): { readonly model: string; readonly symbols: readonly string[] } | null {
  const sides = [placeOf(evidence, expected), placeOf(evidence, measured)];
  const model = sides.find((side) => side.model !== null)?.model ?? null;
  const series = sides.find((side) => side.series !== null)?.series ?? null;
  if (model === null || series === null) return null;
  const values = findingsValues(findings, evidence);
  for (const { at } of sides) {
    const symbols = brokenLimitsAt(values, { model, series, values: at });
    if (symbols.length > 0) return { model, symbols };
  }
  return null;
}

function placeOf(evidence: Evidence, ref: ValueReference): ClaimPlace {
  switch (ref.kind) {
    case 'prediction':
      return { model: ref.model, series: ref.series, at: ref.at };
    case 'mean':
      return { model: null, series: ref.series, at: ref.at };
    case 'quantity': {
      const def = evidence.quantities.find(({ id }) => id === ref.quantity)?.def;
      return { model: def?.origin === 'predicted' ? def.model : null, series: ref.series ?? null, at: {} };
    }
    default:
      return { model: null, series: null, at: {} };
  }
}
