import type { Rational } from '#shared/numeric/rational.ts';
import type { Dimension } from './dimension.ts';

/** One named unit with its prefix and power inside a unit: `mm^2` is { prefix: 'm', name: 'm', power: 2 }. */
export interface UnitFactor {
  readonly prefix: string;
  readonly name: string;
  readonly power: Rational;
}

/**
 * A unit and its exact size: one of it is `factor × π^piPower` in coherent SI (`+ offset` for °C, which
 * may stand only alone). So 1° is (1/180)·π, exact as far as fractions go; `scale` is the nearest double.
 */
export interface Unit {
  /** Canonical text, parsed back to the same unit: `m/s^2`, `µm`, `1`. */
  readonly text: string;
  readonly dimension: Dimension;
  readonly factor: Rational;
  readonly piPower: number;
  readonly offset?: Rational | undefined;
  /** False where the factor itself is a rounded figure: dalton, or a root that is no fraction. */
  readonly exact: boolean;
  /** factor × π^piPower, and its inverse, as doubles. */
  readonly scale: number;
  readonly inverseScale: number;
  /** In the order written. */
  readonly factors: readonly UnitFactor[];
}

/** What parseUnit gives: a unit, or the reason and, where one is near, a unit that may be meant. */
export type UnitResult =
  | { readonly ok: true; readonly unit: Unit }
  | {
      readonly ok: false;
      readonly code: 'unknown unit' | 'ambiguous text' | 'syntax';
      readonly sentence: string;
      /** Unit texts to offer, best first. */
      readonly suggestions: readonly string[];
    };
