import { NARROW_BELOW } from './chart-theme.ts';

/**
 * Height of a comparison chart in CSS pixels for the width it is given: flatter than 2 : 1 where there is room.
 *
 * @param width - width in CSS pixels
 * @example chartHeight(640) // => 294
 * @example chartHeight(342) // => 308
 */
export function chartHeight(width: number): number {
  return Math.round(width < NARROW_BELOW ? width * 0.9 : Math.max(width * 0.46, 260));
}
