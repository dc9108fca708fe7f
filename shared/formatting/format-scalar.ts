import { formatExponent } from '#shared/units/dimension.ts';
import { unitGap, unitSigns } from '#shared/units/unit-signs.ts';
import type { Unit } from '#shared/units/unit.ts';
import { rational } from '#shared/numeric/rational.ts';
import { groupDigits } from './digit-groups.ts';
import { roundedFigures, scalarFigures, type ScalarFigures, type SiValue } from './scalar-figures.ts';
import type { Rounded, RoundingRule } from './rounded.ts';
import { requireUnit } from './unit-text.ts';

const NO_BREAK = '\u00A0';
/** What stands for a value that is not finite. */
const NOT_FINITE = 'not a number';

/**
 * Value ± uncertainty with the unit, as a report prints it: `46.4 ± 0.4 cm`, `(1.23 ± 0.04) × 10⁻⁶ m`.
 * Spaces are no-break; the minus is U+2212.
 *
 * @param scalar - in coherent SI
 * @param unit - unit to show it in, as the register has it
 * @throws RangeError when the unit is none
 * @example formatScalar({ value: 0.4637, u: 0.0039 }, 'cm', 'one or two digits') // => '46.4\u00A0±\u00A00.4\u00A0cm'
 */
export function formatScalar(scalar: SiValue, unit: string, rule: RoundingRule, morePlaces = 0): string {
  const known = requireUnit(unit);
  const figures = scalarFigures(scalar, known, rule, morePlaces);
  return figures === null ? NOT_FINITE : plusMinus(figures, known);
}

/**
 * The same of a number that was rounded already (see roundDifference).
 *
 * @throws RangeError when the unit is none
 * @example formatRounded({ value: { digits: -15n, scale: 1 }, u: { digits: 7n, scale: 1 }, places: 1 }, 'cm') // => '−1.5\u00A0±\u00A00.7\u00A0cm'
 */
export function formatRounded(rounded: Rounded, unit: string): string {
  return plusMinus(roundedFigures(rounded), requireUnit(unit));
}

/**
 * The concise form: `46.4(4) cm`, the bracket counting in the last figure.
 *
 * @throws RangeError when the unit is none
 * @example formatConcise({ value: 0.62517, u: 0.0027 }, '1', 'two digits') // => '0.6252(27)'
 */
export function formatConcise(scalar: SiValue, unit: string, rule: RoundingRule, morePlaces = 0): string {
  const known = requireUnit(unit);
  const figures = scalarFigures(scalar, known, rule, morePlaces);
  if (figures === null) return NOT_FINITE;
  const bracket = figures.lastDigits === null ? '' : `(${figures.lastDigits})`;
  return groupDigits(figures.value) + bracket + powerText(figures.power) + unitGap(known) + unitSigns(known);
}

/**
 * The value alone, still rounded by its uncertainty, with the unit: `46.4 cm`.
 *
 * @throws RangeError when the unit is none
 * @example formatValue({ value: 0.4637, u: 0.0039 }, 'cm', 'one or two digits') // => '46.4\u00A0cm'
 */
export function formatValue(scalar: SiValue, unit: string, rule: RoundingRule, morePlaces = 0): string {
  const known = requireUnit(unit);
  const bare = formatBare(scalar, unit, rule, morePlaces);
  return bare === NOT_FINITE ? bare : bare + unitGap(known) + unitSigns(known);
}

/**
 * The figures alone, for tables that have the unit in the head: `46.4`.
 *
 * @throws RangeError when the unit is none
 * @example formatBare({ value: -0.4637, u: 0.0039 }, 'cm', 'one or two digits') // => '−46.4'
 */
export function formatBare(scalar: SiValue, unit: string, rule: RoundingRule, morePlaces = 0): string {
  const figures = scalarFigures(scalar, requireUnit(unit), rule, morePlaces);
  return figures === null ? NOT_FINITE : groupDigits(figures.value) + powerText(figures.power);
}

/**
 * The uncertainty alone with the unit: `0.4 cm`; `unknown` when there is none.
 *
 * @throws RangeError when the unit is none
 * @example formatUncertainty({ value: 0.4637, u: 0.0039 }, 'cm', 'one or two digits') // => '0.4\u00A0cm'
 */
export function formatUncertainty(scalar: SiValue, unit: string, rule: RoundingRule): string {
  const known = requireUnit(unit);
  const figures = scalarFigures(scalar, known, rule);
  if (figures === null || figures.u === null) return 'unknown';
  return groupDigits(figures.u) + powerText(figures.power) + unitGap(known) + unitSigns(known);
}

function plusMinus(figures: ScalarFigures, unit: Unit): string {
  const value = groupDigits(figures.value);
  const both = figures.u === null ? value : `${value}${NO_BREAK}±${NO_BREAK}${groupDigits(figures.u)}`;
  const held = figures.u !== null && figures.power !== 0 ? `(${both})` : both;
  return held + powerText(figures.power) + unitGap(unit) + unitSigns(unit);
}

function powerText(power: number): string {
  return power === 0 ? '' : `${NO_BREAK}×${NO_BREAK}10${formatExponent(rational(BigInt(power)))}`;
}
