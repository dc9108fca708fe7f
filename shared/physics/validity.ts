/** A range in which a published formula may be used; outside it the value still comes, and says that it is outside. */
export interface ValidRange {
  /** What is limited, in words with its unit: "temperature / °C". */
  readonly of: string;
  readonly min: number;
  readonly max: number;
}

/** A published formula's value with what its authors say of it. */
export interface Correlated {
  readonly value: number;
  /** Standard uncertainty that the formula itself adds, in the value's unit; null when none is published. */
  readonly u: number | null;
  /** Ranges that the inputs leave; empty inside. */
  readonly outside: readonly ValidRange[];
}

/**
 * The ranges that are left by what was put in.
 *
 * @param checked - pairs of a range and the value that must lie in it, in the range's unit
 * @returns the ranges whose value lies outside, in their order
 * @example rangesLeft([[{ of: 't / °C', min: 0, max: 40 }, 50]]).length // => 1
 */
export function rangesLeft(
  checked: readonly (readonly [range: ValidRange, value: number])[],
): readonly ValidRange[] {
  return checked.filter(([{ min, max }, value]) => !(value >= min && value <= max)).map(([range]) => range);
}
