import {
  addRational,
  equalRational,
  formatRational,
  multiplyRational,
  rational,
  RATIONAL_ZERO,
  subtractRational,
  type Rational,
} from '#shared/numeric/rational.ts';

/** The base quantities: seven of the SI, then two tags that SI counts as pure numbers. */
export const BASE_QUANTITIES = [
  'length',
  'mass',
  'time',
  'electric current',
  'temperature',
  'amount of substance',
  'luminous intensity',
  'angle',
  'count',
] as const;
/** Name of one of them. */
export type BaseQuantity = (typeof BASE_QUANTITIES)[number];

/** Number of SI base quantities; exponents behind it are tags. */
const SI_BASE_COUNT = 7;

/**
 * What kind of quantity a value is: one exact exponent for each of BASE_QUANTITIES, in that order.
 * Angle (rad, °) and count (frames, revolutions) are tags: carried along, but never a reason for a mismatch.
 * Source: SI Brochure, 9th edition (2019), section 2.3.3; ISO 80000-1.
 */
export interface Dimension {
  readonly exponents: readonly Rational[];
}

/**
 * A dimension from named exponents.
 *
 * @example formatDimension(dimension({ length: 1, time: -2 })) // => 'm s⁻²'
 */
export function dimension(exponents: Partial<Record<BaseQuantity, number | Rational>>): Dimension {
  return {
    exponents: BASE_QUANTITIES.map((name) => {
      const exponent = exponents[name] ?? RATIONAL_ZERO;
      return typeof exponent === 'number' ? rational(BigInt(exponent)) : exponent;
    }),
  };
}

/** A pure number. */
export const DIMENSIONLESS: Dimension = dimension({});
/** A plane angle: a pure number that is tagged. */
export const ANGLE: Dimension = dimension({ angle: 1 });

/**
 * Dimension of a product.
 *
 * @example formatDimension(multiplyDimensions(dimension({ length: 1 }), dimension({ length: 1 }))) // => 'm²'
 */
export function multiplyDimensions(a: Dimension, b: Dimension): Dimension {
  return combine(a, b, addRational);
}

/**
 * Dimension of a quotient a/b.
 *
 * @example formatDimension(divideDimensions(dimension({ length: 1 }), dimension({ time: 1 }))) // => 'm s⁻¹'
 */
export function divideDimensions(a: Dimension, b: Dimension): Dimension {
  return combine(a, b, subtractRational);
}

/**
 * Dimension of a power with an exact exponent.
 *
 * @example formatDimension(powerDimension(dimension({ length: 1 }), { n: 1n, d: 2n })) // => 'm^(1/2)'
 */
export function powerDimension(base: Dimension, exponent: Rational): Dimension {
  return { exponents: base.exponents.map((own) => multiplyRational(own, exponent)) };
}

/**
 * Whether values may be added, compared or set equal: the SI exponents agree. The tags may differ.
 *
 * @example sameDimension(ANGLE, DIMENSIONLESS) // => true
 */
export function sameDimension(a: Dimension, b: Dimension): boolean {
  return a.exponents.every(
    (own, i) => i >= SI_BASE_COUNT || equalRational(own, b.exponents[i] ?? RATIONAL_ZERO),
  );
}

/**
 * Whether it is a pure number, an angle or a count.
 *
 * @example isDimensionless(ANGLE) // => true
 */
export function isDimensionless(value: Dimension): boolean {
  return sameDimension(value, DIMENSIONLESS);
}

/**
 * Whether it is an angle and nothing else.
 *
 * @example isAngle(ANGLE) // => true
 */
export function isAngle(value: Dimension): boolean {
  return value.exponents.every((own, i) => equalRational(own, ANGLE.exponents[i] ?? RATIONAL_ZERO));
}

const SI_SYMBOLS = ['m', 'kg', 's', 'A', 'K', 'mol', 'cd', 'rad', ''];

/**
 * The dimension in SI base units: `kg m s⁻²`, and `1` for a pure number. Counts are not written.
 *
 * @param symbols - unit to write for each base quantity, in the order of BASE_QUANTITIES; default SI
 * @example formatDimension(dimension({ length: 2 }), ['cm']) // => 'cm²'
 */
export function formatDimension(value: Dimension, symbols: readonly string[] = SI_SYMBOLS): string {
  const written = value.exponents
    .map((exponent, i) => ({
      exponent,
      symbol: symbols[i] ?? SI_SYMBOLS[i] ?? '',
      order: WRITING_ORDER[i] ?? i,
    }))
    .filter(({ exponent, symbol }) => exponent.n !== 0n && symbol !== '')
    .sort((a, b) => a.order - b.order)
    .map(({ exponent, symbol }) => symbol + formatExponent(exponent));
  return written.length === 0 ? '1' : written.join(' ');
}

/** Mass is written before length, as in kg m s⁻². */
const WRITING_ORDER = [1, 0, 2, 3, 4, 5, 6, 7, 8];

const SUPERSCRIPTS = '⁰¹²³⁴⁵⁶⁷⁸⁹';

/**
 * An exponent as raised figures (`²`, `⁻¹`), nothing for 1, and `^(1/2)` for a fraction.
 *
 * @example formatExponent({ n: -2n, d: 1n }) // => '⁻²'
 */
export function formatExponent(exponent: Rational): string {
  if (exponent.d !== 1n) return `^(${formatRational(exponent)})`;
  if (exponent.n === 1n) return '';
  return [...String(exponent.n)].map((sign) => (sign === '-' ? '⁻' : SUPERSCRIPTS[Number(sign)])).join('');
}

function combine(a: Dimension, b: Dimension, by: (x: Rational, y: Rational) => Rational): Dimension {
  return { exponents: a.exponents.map((own, i) => by(own, b.exponents[i] ?? RATIONAL_ZERO)) };
}
