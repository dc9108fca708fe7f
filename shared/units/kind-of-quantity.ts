import { dimension, isAngle, isDimensionless, sameDimension, type Dimension } from './dimension.ts';

const KINDS: readonly (readonly [string, Dimension])[] = [
  ['a length', dimension({ length: 1 })],
  ['an area', dimension({ length: 2 })],
  ['a volume', dimension({ length: 3 })],
  ['a time', dimension({ time: 1 })],
  ['a mass', dimension({ mass: 1 })],
  ['a speed', dimension({ length: 1, time: -1 })],
  ['an acceleration', dimension({ length: 1, time: -2 })],
  ['a frequency', dimension({ time: -1 })],
  ['a force', dimension({ mass: 1, length: 1, time: -2 })],
  ['a pressure', dimension({ mass: 1, length: -1, time: -2 })],
  ['an energy', dimension({ mass: 1, length: 2, time: -2 })],
  ['a power', dimension({ mass: 1, length: 2, time: -3 })],
  ['a density', dimension({ mass: 1, length: -3 })],
  ['a surface tension', dimension({ mass: 1, time: -2 })],
  ['a dynamic viscosity', dimension({ mass: 1, length: -1, time: -1 })],
  ['a kinematic viscosity', dimension({ length: 2, time: -1 })],
  ['a temperature', dimension({ temperature: 1 })],
  ['a current', dimension({ 'electric current': 1 })],
  ['a charge', dimension({ 'electric current': 1, time: 1 })],
  ['a voltage', dimension({ mass: 1, length: 2, time: -3, 'electric current': -1 })],
  ['a resistance', dimension({ mass: 1, length: 2, time: -3, 'electric current': -2 })],
  ['a magnetic field', dimension({ mass: 1, time: -2, 'electric current': -1 })],
];

/**
 * The everyday name of what a dimension measures, with its article; null when it has none.
 */
export function kindOfQuantity(value: Dimension): string | null {
  if (isAngle(value)) return 'an angle';
  if (isDimensionless(value)) return 'a pure number';
  return KINDS.find(([, kind]) => sameDimension(kind, value))?.[0] ?? null;
}
