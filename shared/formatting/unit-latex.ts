import { formatRational } from '#shared/numeric/rational.ts';
import type { UnitFactor } from '#shared/units/unit.ts';
import { requireUnit } from './unit-text.ts';

/**
 * A unit in LaTeX: upright, thin spaces between factors, negative powers; empty for a pure number.
 *
 * @throws RangeError when the text is no unit
 * @example unitToLatex('m/s^2') // => '\\mathrm{m\\,s^{-2}}'
 * @example unitToLatex('°') // => '^{\\circ}'
 * @example unitToLatex('1') // => ''
 */
export function unitToLatex(unit: string): string {
  const { factors } = requireUnit(unit);
  if (factors.length === 0) return '';
  if (isPlainDegree(factors)) return '^{\\circ}';
  return `\\mathrm{${factors.map(factorToLatex).join('\\,')}}`;
}

/**
 * What stands between a number and its unit in LaTeX: a thin space, but nothing before ° or a pure number.
 *
 * @throws RangeError when the text is no unit
 * @example unitGapLatex('cm') // => '\\,'
 * @example unitGapLatex('°') // => ''
 */
export function unitGapLatex(unit: string): string {
  const { factors } = requireUnit(unit);
  return factors.length === 0 || isPlainDegree(factors) ? '' : '\\,';
}

/** Signs that LaTeX writes by command inside upright text. */
const SIGNS: Readonly<Record<string, string>> = {
  '°': '{}^{\\circ}',
  '°C': '{}^{\\circ}C',
  Ω: '\\Omega',
  '%': '\\%',
  '‰': '\\text{‰}',
  Å: '\\text{Å}',
};

function factorToLatex({ prefix, name, power }: UnitFactor): string {
  const sign = (prefix === 'µ' ? '\\text{µ}' : prefix) + (SIGNS[name] ?? name);
  const raised = power.d === 1n && power.n === 1n ? '' : `^{${formatRational(power)}}`;
  return raised !== '' && sign.includes('^') ? `{${sign}}${raised}` : sign + raised;
}

function isPlainDegree(factors: readonly UnitFactor[]): boolean {
  const [first] = factors;
  return factors.length === 1 && first?.name === '°' && first.power.n === 1n && first.power.d === 1n;
}
