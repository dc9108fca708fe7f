import { formatExponent } from './dimension.ts';
import type { Unit } from './unit.ts';

const NO_BREAK = '\u00A0';

/**
 * The unit as it is printed: factors with raised powers, no-break spaces between, nothing for a pure number.
 * Source: SI Brochure, 9th edition, section 5.2.
 *
 * @example unitSigns({ factors: [] }) // => ''
 * @example unitSigns({ factors: [{ prefix: 'c', name: 'm', power: { n: 2n, d: 1n } }] }) // => 'cm²'
 */
export function unitSigns(unit: Pick<Unit, 'factors'>): string {
  return unit.factors.map(({ prefix, name, power }) => prefix + name + formatExponent(power)).join(NO_BREAK);
}

/**
 * What stands between a number and its unit: a no-break space, but nothing before °, as the SI writes it.
 *
 * @example unitGap({ factors: [{ prefix: '', name: '°', power: { n: 1n, d: 1n } }] }) // => ''
 */
export function unitGap(unit: Pick<Unit, 'factors'>): string {
  const [first] = unit.factors;
  return first === undefined || (first.name === '°' && unit.factors.length === 1) ? '' : NO_BREAK;
}
