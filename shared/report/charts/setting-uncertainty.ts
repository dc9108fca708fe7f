import type { Evidence } from '#shared/evidence/evidence.ts';
import type { ComparisonPoint } from '#shared/evidence/findings.ts';
import { statedParts } from '#shared/evidence/instrument-parts.ts';
import { norm } from '#shared/numeric/norm.ts';
import { readSi } from '#shared/units/reading.ts';

/**
 * Standard uncertainty of one setting of a compared point: what its reading states in the place of the instrument's
 * own parts, together with the instrument's other parts. It is drawn as the point's horizontal bar; the sums behind
 * verdicts are made elsewhere, source by source.
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
  const read = reading && readSi(reading);
  if (!read?.ok) return null;
  const row = evidence.quantities.find((one) => one.id === quantity);
  const instrumentId = row?.def.origin === 'recorded' ? row.def.instrument : null;
  const instrument = evidence.instruments.find((one) => one.id === instrumentId);
  if (!row || !instrument || instrument.parts.length === 0) return read.u;
  const owner = { words: instrument.name, at: instrument.id, symbol: row.symbol, unit: read.unit };
  const parts = statedParts(instrument.parts, owner);
  if ('shape' in parts) return read.u;
  const amounts = parts
    .filter((part) => read.u === null || part.shared)
    .map((part) => (part.relative ? part.amount * read.value : part.amount));
  return norm(Float64Array.from(read.u === null ? amounts : [...amounts, read.u]));
}
