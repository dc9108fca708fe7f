import { findNamedUnit } from '#shared/units/find-named-unit.ts';
import type { UnitFactor } from '#shared/units/unit.ts';
import type { RoundingRule } from './rounded.ts';
import { scalarFigures, type SiValue } from './scalar-figures.ts';
import { requireUnit } from './unit-text.ts';

/**
 * A value in words, for screen readers: `46.4 plus or minus 0.4 centimetres`.
 *
 * @param scalar - in coherent SI
 * @param unit - unit to say it in, as the register has it
 * @throws RangeError when the unit is none
 * @example spokenScalar({ value: 0.4637, u: 0.0039 }, 'cm', 'one or two digits') // => '46.4 plus or minus 0.4 centimetres'
 */
export function spokenScalar(scalar: SiValue, unit: string, rule: RoundingRule, morePlaces = 0): string {
  const figures = scalarFigures(scalar, requireUnit(unit), rule, morePlaces);
  if (figures === null) return 'not a number';
  const u = figures.u === null ? '' : ` plus or minus ${figures.u}`;
  const power = figures.power === 0 ? '' : `, times ten to the ${spokenSign(String(figures.power))}`;
  const words = spokenUnit(unit, figures.value !== '1' || u !== '');
  return `${spokenSign(figures.value)}${u}${power}${words === '' ? '' : ` ${words}`}`;
}

/**
 * A unit in words: `centimetres`, `metres per second squared`; nothing for a pure number.
 *
 * @param plural - of the first unit
 * @throws RangeError when the text is no unit
 * @example spokenUnit('m/s^2', true) // => 'metres per second squared'
 * @example spokenUnit('°', false) // => 'degree'
 */
export function spokenUnit(unit: string, plural: boolean): string {
  const { factors } = requireUnit(unit);
  const above = factors.filter(({ power }) => power.n > 0n);
  const below = factors.filter(({ power }) => power.n < 0n);
  const top = above.map((factor, i) => spokenFactor(factor, plural && i === above.length - 1));
  const bottom = below.map((factor) => `per ${spokenFactor(factor, false)}`);
  return [...top, ...bottom].join(' ');
}

function spokenFactor({ prefix, name, power }: UnitFactor, plural: boolean): string {
  const named = findNamedUnit(prefix + name);
  const word = (named?.prefix?.spoken ?? '') + ((plural ? named?.unit.plural : named?.unit.singular) ?? name);
  const size = power.n < 0n ? -power.n : power.n;
  if (power.d !== 1n) return `${word} to the ${size} over ${power.d}`;
  if (size === 1n) return word;
  const dimension = named?.unit.names[0] === 'm' ? (['square ', 'cubic '][Number(size) - 2] ?? '') : '';
  if (dimension !== '') return dimension + word;
  return size === 2n ? `${word} squared` : size === 3n ? `${word} cubed` : `${word} to the ${size}`;
}

function spokenSign(figures: string): string {
  return figures.replace('-', 'minus ');
}
