import {
  BASE_QUANTITIES,
  dimension,
  divideDimensions,
  formatDimension,
  isAngle,
  isDimensionless,
  powerDimension,
  sameDimension,
  type Dimension,
} from '#shared/units/dimension.ts';
import { kindOfQuantity } from '#shared/units/kind-of-quantity.ts';
import { parseUnit } from '#shared/units/parse-unit.ts';
import { unitSigns } from '#shared/units/unit-signs.ts';

/**
 * A dimension in the units that a formula's quantities are shown in: `cm²` rather than m², where lengths are in cm.
 *
 * @param units - texts of the units in use, the most fitting first
 * @example dimensionWords(dimensionOfText('m^2'), ['cm', 's']) // => 'cm²'
 */
export function dimensionWords(value: Dimension, units: readonly string[]): string {
  if (isDimensionless(value)) return isAngle(value) ? 'an angle' : 'a pure number';
  const known = units.flatMap((text) => {
    const parsed = parseUnit(text);
    return parsed.ok ? [parsed.unit] : [];
  });
  const same = known.find((unit) => sameDimension(unit.dimension, value));
  if (same !== undefined) return unitSigns(same);
  const bases = BASE_QUANTITIES.map((name) => {
    const base = dimension({ [name]: 1 });
    const found = known.find((unit) => unit.factors.length === 1 && sameDimension(unit.dimension, base));
    return found !== undefined && !isDimensionless(base) ? unitSigns(found) : undefined;
  });
  // Tags are no part of what must agree, so they are not named.
  return formatDimension(
    value,
    [...bases.slice(0, 7), '', ''].map((sign, i) => sign ?? SI_SIGNS[i] ?? ''),
  );
}

const SI_SIGNS = ['m', 'kg', 's', 'A', 'K', 'mol', 'cd'];

/**
 * The dimension of a unit's text; a pure number when it is no unit.
 *
 * @example dimensionOfText('cm').exponents[0] // => { n: 1n, d: 1n }
 */
export function dimensionOfText(unit: string): Dimension {
  const parsed = parseUnit(unit);
  return parsed.ok ? parsed.unit.dimension : dimension({});
}

/**
 * A question that proposes what may be missing where two sides do not agree; empty when nothing is near.
 *
 * @example mismatchHint(dimensionOfText('cm'), dimensionOfText('cm^2')) // => 'Is a square root missing?'
 * @example mismatchHint(dimensionOfText('m/s'), dimensionOfText('m')) // => 'Is a division by a time missing?'
 */
export function mismatchHint(left: Dimension, right: Dimension): string {
  if (isDimensionless(left) || isDimensionless(right)) {
    return isDimensionless(left) ? 'Should it be divided by a scale of its own kind?' : '';
  }
  const two = { n: 2n, d: 1n };
  if (sameDimension(right, powerDimension(left, two))) return 'Is a square root missing?';
  if (sameDimension(left, powerDimension(right, two))) return 'Is a square missing?';
  const divided = simpleKind(divideDimensions(right, left));
  const multiplied = simpleKind(divideDimensions(left, right));
  if (divided !== null) return `Is a division by ${divided} missing?`;
  return multiplied === null ? '' : `Is a multiplication by ${multiplied} missing?`;
}

/** Only what people lose from formulas: a length, a time or a mass. */
function simpleKind(value: Dimension): string | null {
  const kind = kindOfQuantity(value);
  return kind === 'a length' || kind === 'a time' || kind === 'a mass' ? kind : null;
}
