import type { Evidence, UncertaintyPart } from '#shared/evidence/evidence.ts';
import type { ComparisonPoint } from '#shared/evidence/findings.ts';
import { uncertaintyToSi } from '#shared/units/convert.ts';
import { parseUnit } from '#shared/units/parse-unit.ts';
import { readSi } from '#shared/units/reading.ts';

/** Divisors that turn a half-width into a standard uncertainty, JCGM 100:2008, 4.3.7 to 4.3.9 and F.2.2.1. */
const DIVISOR = { rectangular: Math.sqrt(3), triangular: Math.sqrt(6), arcsine: Math.SQRT2 } as const;
const RESOLUTION_DIVISOR = Math.sqrt(12);

/**
 * Standard uncertainty of one setting of a compared point: what its reading states, else the instrument's parts.
 * It is drawn as the point's horizontal bar; the sums behind verdicts are made elsewhere, by source.
 *
 * @param point - the point; its settings hold the readings
 * @param quantity - id of the setting
 * @returns u in SI, k = 1; null when nothing is known of it
 */
export function settingUncertainty(
  point: ComparisonPoint,
  quantity: string,
  evidence: Evidence,
): number | null {
  const reading = point.settings[quantity];
  if (!reading) return null;
  const read = readSi(reading);
  if (!read.ok) return null;
  if (read.u !== null) return read.u;
  const def = evidence.quantities.find((row) => row.id === quantity)?.def;
  const instrumentId = def?.origin === 'recorded' ? def.instrument : null;
  const instrument = evidence.instruments.find((row) => row.id === instrumentId);
  if (!instrument || instrument.parts.length === 0) return null;
  const parts = instrument.parts.map((part) => partInSi(part, read.value));
  return Math.hypot(...parts.map((u) => u ?? 0));
}

function partInSi(part: UncertaintyPart, value: number): number | null {
  const amount = Number(part.amount.replace(',', '.'));
  if (!Number.isFinite(amount)) return null;
  const divisor =
    part.kind === 'resolution' && part.shape === 'rectangular'
      ? RESOLUTION_DIVISOR
      : part.shape === 'normal'
        ? (part.k ?? 1)
        : DIVISOR[part.shape];
  if (part.kind === 'scale') return Math.abs((amount / divisor) * value);
  const unit = parseUnit(part.unit);
  return unit.ok ? uncertaintyToSi(amount / divisor, unit.unit) : null;
}
