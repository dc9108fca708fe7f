import { rationalToNumber } from '#shared/numeric/rational.ts';
import type { Unit } from './unit.ts';

/**
 * A value in some unit, in coherent SI, to the last bit or two of a double. Readings go through readSi, which starts
 * from their decimals and rounds once.
 *
 * @example toSi(20, { scale: 0.01, inverseScale: 100 }) // => 0.2
 */
export function toSi(value: number, unit: Pick<Unit, 'scale' | 'inverseScale' | 'offset'>): number {
  return uncertaintyToSi(value, unit) + offsetOf(unit);
}

/**
 * A value in coherent SI, in some unit.
 *
 * @example fromSi(0.464, { scale: 0.01, inverseScale: 100 }) // => 46.400000000000006
 */
export function fromSi(value: number, unit: Pick<Unit, 'scale' | 'inverseScale' | 'offset'>): number {
  return uncertaintyFromSi(value - offsetOf(unit), unit);
}

/**
 * A difference or uncertainty in coherent SI: the unit's zero (of °C) plays no part.
 *
 * @example uncertaintyToSi(0.4, { scale: 0.01, inverseScale: 100 }) // => 0.004
 */
export function uncertaintyToSi(u: number, unit: Pick<Unit, 'scale' | 'inverseScale'>): number {
  // Dividing by 100 rounds once; multiplying by the double nearest to 0.01 rounds twice.
  return Number.isInteger(unit.inverseScale) ? u / unit.inverseScale : u * unit.scale;
}

/**
 * A difference or uncertainty given in coherent SI, in some unit.
 *
 * @example uncertaintyFromSi(0.5, { scale: 0.01, inverseScale: 100 }) // => 50
 */
export function uncertaintyFromSi(u: number, unit: Pick<Unit, 'scale' | 'inverseScale'>): number {
  return Number.isInteger(unit.inverseScale) ? u * unit.inverseScale : u / unit.scale;
}

function offsetOf(unit: Pick<Unit, 'offset'>): number {
  return unit.offset === undefined ? 0 : rationalToNumber(unit.offset);
}
