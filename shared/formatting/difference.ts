import { compareDecimals, roundDecimal, subtractDecimals } from '#shared/numeric/decimal.ts';
import { roundWithUncertainty, type Rounded, type RoundingRule } from './rounded.ts';

/** A value and its uncertainty in the unit all three are shown in. */
export interface ShownValue {
  readonly value: number;
  readonly u: number | null;
}

/**
 * Rounds two values and their difference a − b, which was taken before rounding. Where the shown figures would not
 * subtract to the shown difference, all three get one more decimal.
 *
 * @returns the three as they are shown, and how many more places that took (0 or 1)
 * @example roundDifference({ value: 46.37, u: 0.4 }, { value: 47.94, u: 0.5 }, { value: -1.57, u: 0.7 }, 'one or two digits').morePlaces // => 1
 */
export function roundDifference(
  a: ShownValue,
  b: ShownValue,
  difference: ShownValue,
  rule: RoundingRule,
): { readonly a: Rounded; readonly b: Rounded; readonly difference: Rounded; readonly morePlaces: 0 | 1 } {
  const plain = roundThree(a, b, difference, rule, 0);
  return subtracts(plain)
    ? { ...plain, morePlaces: 0 }
    : { ...roundThree(a, b, difference, rule, 1), morePlaces: 1 };
}

function roundThree(
  a: ShownValue,
  b: ShownValue,
  difference: ShownValue,
  rule: RoundingRule,
  morePlaces: 0 | 1,
) {
  return {
    a: roundWithUncertainty(a.value, a.u, rule, morePlaces),
    b: roundWithUncertainty(b.value, b.u, rule, morePlaces),
    difference: roundWithUncertainty(difference.value, difference.u, rule, morePlaces),
  };
}

/** In the coarsest place shown, the figures of a and b must give those of the difference. */
function subtracts({ a, b, difference }: ReturnType<typeof roundThree>): boolean {
  const places = Math.min(a.places, b.places, difference.places);
  const shown = roundDecimal(subtractDecimals(a.value, b.value), places);
  return compareDecimals(shown, roundDecimal(difference.value, places)) === 0;
}
