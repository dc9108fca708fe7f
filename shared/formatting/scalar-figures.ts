import { decimalToText, type Decimal } from '#shared/numeric/decimal.ts';
import { fromSi, uncertaintyFromSi } from '#shared/units/convert.ts';
import type { Unit } from '#shared/units/unit.ts';
import { roundWithUncertainty, type Rounded, type RoundingRule } from './rounded.ts';

/** A value with its standard uncertainty, both in coherent SI; u null when nothing is known of it. */
export interface SiValue {
  readonly value: number;
  readonly u: number | null;
}

/** The figures of a value, ready to be set: plain figures with a point and an ASCII minus. */
export interface ScalarFigures {
  readonly value: string;
  readonly u: string | null;
  /** u in units of the last place shown, for the concise form. */
  readonly lastDigits: string | null;
  /** Power of ten that both are to be multiplied with; 0 in the usual range. */
  readonly power: number;
}

/**
 * The figures of a value in some unit: rounded by its uncertainty, with a power of ten outside 10^-4 … 10^6.
 *
 * @param morePlaces - further decimal places wanted
 * @returns null when the value is not finite
 * @example scalarFigures({ value: 0.4637, u: 0.0039 }, { scale: 0.01, inverseScale: 100 }, 'one or two digits') // => { value: '46.4', u: '0.4', lastDigits: '4', power: 0 }
 */
export function scalarFigures(
  scalar: SiValue,
  unit: Pick<Unit, 'scale' | 'inverseScale' | 'offset'>,
  rule: RoundingRule,
  morePlaces = 0,
): ScalarFigures | null {
  const value = fromSi(scalar.value, unit);
  const u = scalar.u === null ? null : uncertaintyFromSi(scalar.u, unit);
  if (!Number.isFinite(value) || (u !== null && !Number.isFinite(u))) return null;
  return roundedFigures(roundWithUncertainty(value, u, rule, morePlaces));
}

/**
 * The figures of a number that has been rounded already.
 *
 * @example roundedFigures({ value: { digits: 123n, scale: 8 }, u: { digits: 4n, scale: 8 }, places: 8 }) // => { value: '1.23', u: '0.04', lastDigits: '4', power: -6 }
 */
export function roundedFigures(rounded: Rounded): ScalarFigures {
  const power = powerOfTen(rounded);
  const lastDigits = rounded.u === null ? null : String(lastPlace(rounded.u));
  return {
    value: decimalToText(shift(rounded.value, power)),
    u: rounded.u === null ? null : decimalToText(shift(rounded.u, power)),
    lastDigits,
    power,
  };
}

function powerOfTen(rounded: Rounded): number {
  const size = Math.max(order(rounded.value), rounded.u === null ? -Infinity : order(rounded.u));
  return Number.isFinite(size) && (size >= 6 || size < -4) ? size : 0;
}

/** Power of ten of the first figure; −∞ for 0. */
function order({ digits, scale }: Decimal): number {
  if (digits === 0n) return -Infinity;
  return String(digits < 0n ? -digits : digits).length - 1 - scale;
}

function shift({ digits, scale }: Decimal, power: number): Decimal {
  return { digits, scale: scale + power };
}

/** 480 ± 30 is 480(30): above the point the figures are counted in ones. */
function lastPlace({ digits, scale }: Decimal): bigint {
  return scale >= 0 ? digits : digits * 10n ** BigInt(-scale);
}
