import { groupDigits } from './digit-groups.ts';
import { scalarFigures, type SiValue } from './scalar-figures.ts';
import type { RoundingRule } from './rounded.ts';
import { unitGapLatex, unitToLatex } from './unit-latex.ts';
import { requireUnit } from './unit-text.ts';

/** Which parts of a value are set. */
export type LatexForm = 'value and uncertainty' | 'concise' | 'value' | 'figures';

/**
 * A value in LaTeX: `46.4\pm 0.4\,\mathrm{cm}`, `46.4(4)\,\mathrm{cm}`, `46.4\,\mathrm{cm}` or `46.4`.
 *
 * @param scalar - in coherent SI
 * @param unit - unit to show it in, as the register has it
 * @throws RangeError when the unit is none
 * @example scalarToLatex({ value: 0.4637, u: 0.0039 }, 'cm', 'one or two digits', 'value') // => '46.4\\,\\mathrm{cm}'
 * @example scalarToLatex({ value: 0.6632, u: 0.0087 }, '°', 'one or two digits', 'value') // => '38.0^{\\circ}'
 */
export function scalarToLatex(
  scalar: SiValue,
  unit: string,
  rule: RoundingRule,
  form: LatexForm,
  morePlaces = 0,
): string {
  const figures = scalarFigures(scalar, requireUnit(unit), rule, morePlaces);
  if (figures === null) return '\\text{not a number}';
  const value = figuresToLatex(figures.value);
  const power = figures.power === 0 ? '' : `\\times 10^{${figures.power}}`;
  if (form === 'figures') return value + power;
  const tail = power + unitGapLatex(unit) + unitToLatex(unit);
  if (figures.u === null || form === 'value') return value + tail;
  if (form === 'concise') return `${value}(${figures.lastDigits})${tail}`;
  const both = `${value}\\pm ${figuresToLatex(figures.u)}`;
  return (power === '' ? both : `(${both})`) + tail;
}

/**
 * Plain figures in LaTeX: groups of three by thin spaces, the sign as a sign and not an operation.
 *
 * @example figuresToLatex('-12345.6') // => '{-}12\\,345.6'
 */
export function figuresToLatex(figures: string): string {
  return groupDigits(figures, '\\,').replace('−', '{-}');
}
