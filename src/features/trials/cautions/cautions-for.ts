import cautionCards from '#templates/cautions.json';
import type { Evidence } from '#shared/evidence/evidence.ts';
import { parseUnit } from '#shared/units/parse-unit.ts';
import { sameDimension } from '#shared/units/dimension.ts';
import { readSi } from '#shared/units/reading.ts';
import { toSi } from '#shared/units/convert.ts';

/** A usual caution: what may hurt, and what is commonly done about it. */
export interface CautionCard {
  readonly hazard: string;
  readonly cautions: readonly string[];
}

interface CautionTemplate extends CautionCard {
  /** Any of these in the task or in a quantity's name brings the card up. */
  readonly words: readonly string[];
  /** So does any reading of the same kind above this value. */
  readonly above?: { readonly unit: string; readonly value: number };
}

const TEMPLATES: readonly CautionTemplate[] = cautionCards;

/** The cards that the task and the register bring up. They are reminders of common practice and clear nothing. */
export function cautionsFor(statement: string, evidence: Evidence): CautionCard[] {
  const text = [statement, ...evidence.quantities.map(({ name }) => name)].join(' ').toLowerCase();
  return TEMPLATES.filter(
    ({ words, above }) =>
      words.some((word) => new RegExp(`\\b${word}`, 'i').test(text)) ||
      (above && isExceeded(above, evidence)),
  );
}

function isExceeded({ unit, value }: { unit: string; value: number }, evidence: Evidence): boolean {
  const limit = parseUnit(unit);
  if (!limit.ok) return false;
  const threshold = toSi(value, limit.unit);
  const constants = evidence.quantities.flatMap(({ def }) =>
    def.origin === 'constant' && def.reading ? [def.reading] : [],
  );
  const held = evidence.series.flatMap((series) => Object.values(series.held));
  return [...constants, ...held].some((reading) => {
    const si = readSi(reading);
    return si.ok && sameDimension(si.dimension, limit.unit.dimension) && si.value > threshold;
  });
}
