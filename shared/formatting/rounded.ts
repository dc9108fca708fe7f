import { numberToDecimal, roundDecimal, type Decimal } from '#shared/numeric/decimal.ts';

/** How many figures an uncertainty is shown with: two, or one unless the first of them is 1. */
export type RoundingRule = 'two digits' | 'one or two digits';

/** A value and its uncertainty as they are shown, both with the same number of decimal places. */
export interface Rounded {
  readonly value: Decimal;
  /** null when no uncertainty is known, or it is exactly nought. */
  readonly u: Decimal | null;
  /** Decimal places of both; negative when tens or hundreds are the last place that counts. */
  readonly places: number;
}

/** Figures shown of a value that has no uncertainty. */
const FIGURES_WITHOUT_U = 6;

/**
 * Rounds an uncertainty to the figures that count and the value to the same place, ties to even.
 * Source: JCGM 100:2008, 7.2.6; ISO 80000-1, annex B.
 *
 * Doubles are first taken to 13 digits (more where the uncertainty asks for it), so that the last bits, in which
 * machines differ, cannot turn a tie.
 *
 * @param value - finite, in the unit it is shown in
 * @param u - standard uncertainty in that unit; null or 0: the value is shown with at most 6 figures
 * @param rule - figures of the uncertainty
 * @param morePlaces - further decimal places wanted
 * @throws RangeError when value or u is not finite, or u is negative
 * @example roundWithUncertainty(10.05762, 0.027, 'two digits').value // => { digits: 10058n, scale: 3 }
 * @example roundWithUncertainty(46.37, 0.39, 'one or two digits').places // => 1
 */
export function roundWithUncertainty(
  value: number,
  u: number | null,
  rule: RoundingRule,
  morePlaces = 0,
): Rounded {
  if (!Number.isFinite(value) || (u !== null && !(u >= 0 && u < Infinity))) {
    throw new RangeError(`roundWithUncertainty: needs finite numbers and u ≥ 0, got ${value} and ${u}`);
  }
  if (u === null || u === 0) return withoutUncertainty(value, morePlaces);
  const places = placesOfUncertainty(u, rule) + morePlaces;
  return { value: roundNumber(value, places), u: roundNumber(u, places), places };
}

/**
 * Decimal places that an uncertainty is shown with.
 *
 * @param u - finite and > 0
 * @example placesOfUncertainty(0.027, 'two digits') // => 3
 * @example placesOfUncertainty(0.0996, 'two digits') // => 2
 * @example placesOfUncertainty(0.39, 'one or two digits') // => 1
 * @example placesOfUncertainty(0.14, 'one or two digits') // => 2
 */
export function placesOfUncertainty(u: number, rule: RoundingRule): number {
  const [mantissa = '', exponent = '0'] = u.toExponential(12).split('e');
  const order = Number(exponent);
  if (rule === 'one or two digits') return mantissa.startsWith('1') ? 1 - order : -order;
  // 0.0996 becomes 0.10, not 0.100: rounding may carry into a new first figure.
  const carried = roundDecimal(numberToDecimal(Number(mantissa), 13), 1).digits >= 100n;
  return carried ? -order : 1 - order;
}

/**
 * Rounds a double to decimal places, ties to even, after taking it to its leading digits.
 *
 * @example roundNumber(46.449999999999996, 1) // => { digits: 464n, scale: 1 }
 */
export function roundNumber(value: number, places: number): Decimal {
  if (value === 0) return { digits: 0n, scale: places };
  const leading = Math.floor(Math.log10(Math.abs(value)));
  const digits = Math.min(17, Math.max(13, leading + places + 4));
  return roundDecimal(numberToDecimal(value, digits), places);
}

/**
 * An interval rounded outward: the lower limit down, the upper limit up, so that it still holds what it held.
 *
 * @example roundOutward(3.99853, 4.33251, 2).high // => { digits: 434n, scale: 2 }
 */
export function roundOutward(
  low: number,
  high: number,
  places: number,
): { readonly low: Decimal; readonly high: Decimal } {
  return {
    low: roundDecimal(numberToDecimal(low, 13), places, 'down'),
    high: roundDecimal(numberToDecimal(high, 13), places, 'up'),
  };
}

function withoutUncertainty(value: number, morePlaces: number): Rounded {
  let { digits, scale } = numberToDecimal(Number(value.toPrecision(FIGURES_WITHOUT_U)));
  // 10 000 000 is set as 10^7, so its noughts do not count as places.
  while (digits !== 0n && digits % 10n === 0n && Math.abs(value) >= 1e6) {
    digits /= 10n;
    scale -= 1;
  }
  const places = scale + morePlaces;
  return { value: roundDecimal(numberToDecimal(value, 13), places), u: null, places };
}
