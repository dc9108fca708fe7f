import type { Evidence, Quantity } from '#shared/evidence/evidence.ts';
import { findValue } from '#shared/evidence/find-value.ts';
import type { Fault, Findings, Hue } from '#shared/evidence/findings.ts';
import { formatBare, formatScalar } from '#shared/formatting/format-scalar.ts';
import { unitToText } from '#shared/formatting/unit-text.ts';

/** What the register says of a quantity's value. */
export type QuantityValue =
  | { readonly kind: 'value'; readonly text: string; readonly hue: Hue; readonly where: string | null }
  /** Read in every trial: only how well it is read. */
  | { readonly kind: 'each trial'; readonly text: string }
  | { readonly kind: 'not measured' }
  | { readonly kind: 'fault'; readonly sentence: string };

export function quantityValue(quantity: Quantity, evidence: Evidence, findings: Findings): QuantityValue {
  const { id, unit, def } = quantity;
  if (def.origin === 'recorded')
    return { kind: 'each trial', text: readingUncertainty(quantity, evidence, findings) };
  if (def.origin === 'constant' && def.reading === null) return { kind: 'not measured' };
  const { rounding } = evidence.settings;
  const found = findValue(findings, evidence, { kind: 'quantity', quantity: id });
  if (found.shape === 'scalar') {
    return { kind: 'value', text: formatScalar(found, unit, rounding), hue: found.hue, where: null };
  }
  if (found.code !== 'no single value') return { kind: 'fault', sentence: found.sentence };
  for (const { id: series, letter } of [...evidence.series].reverse()) {
    const there = findValue(findings, evidence, { kind: 'quantity', quantity: id, series });
    if (there.shape === 'scalar') {
      return {
        kind: 'value',
        text: formatScalar(there, unit, rounding),
        hue: there.hue,
        where: `in series ${letter}`,
      };
    }
    if (isRealFault(there)) return { kind: 'fault', sentence: there.sentence };
  }
  return { kind: 'each trial', text: 'varies' };
}

/** Being a column, or unused in a series, is no fault of the quantity. */
function isRealFault({ code }: Fault): boolean {
  return !['no single value', 'no trials', 'missing input', 'not measured'].includes(code);
}

/** "± 0.4 cm": as typed with the last reading, else the instrument's own part. */
function readingUncertainty({ id, unit }: Quantity, evidence: Evidence, findings: Findings): string {
  const unitText = unit === '1' ? '' : unit === '°' ? '°' : `\u00a0${unitToText(unit)}`;
  const typed = evidence.trials.findLast((trial) => {
    const reading = trial.values[id];
    return reading?.u !== undefined && reading.unit === unit;
  })?.values[id]?.u;
  if (typed !== undefined) return `± ${typed}${unitText}`;
  for (const { id: series } of evidence.series) {
    const column = findings.values.get(`${id}@${series}`);
    const own = column?.shape === 'column' ? column.own[0] : undefined;
    if (own) return `± ${formatBare({ value: own, u: own }, unit, evidence.settings.rounding)}${unitText}`;
  }
  return unitText === '' ? 'a number' : unitText.trim();
}
