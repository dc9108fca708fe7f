/** Shape of the distribution that a stated half-width belongs to. */
export type StatedShape = 'normal' | 'rectangular' | 'triangular' | 'arcsine';

const DIVISORS = { rectangular: Math.sqrt(3), triangular: Math.sqrt(6), arcsine: Math.SQRT2 } as const;

/**
 * Standard uncertainty of a statement (Type B): half-width over the divisor of its shape.
 *
 * Divisors: rectangular √3, triangular √6, arcsine √2, normal k (an expanded uncertainty U = k·u).
 * Source: JCGM 100:2008, 4.3.3 to 4.3.9; arcsine: JCGM 101:2008, 6.4.6.
 *
 * @param halfWidth - half-width, or U for a normal shape, in any one unit
 * @param k - coverage factor of a normal statement, > 0; default 1; other shapes ignore it
 * @returns standard uncertainty in the same unit
 * @example statedUncertainty(0.5, 'normal', 2) // => 0.25
 */
export function statedUncertainty(halfWidth: number, shape: StatedShape, k = 1): number {
  return halfWidth / (shape === 'normal' ? k : DIVISORS[shape]);
}
