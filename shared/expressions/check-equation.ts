import { sameDimension, type Dimension } from '#shared/units/dimension.ts';
import { parseUnit } from '#shared/units/parse-unit.ts';
import { dimensionOf } from './dimension-of.ts';
import { dimensionWords, mismatchHint } from './dimension-words.ts';
import type { Expression, ExpressionFault } from './expression.ts';
import { expressionFault } from './tokens.ts';

/** An equation whose left side is a quantity and whose right side is an expression. */
export interface Equation {
  /** Unit the left side is shown in. */
  readonly left: string;
  readonly expression: Expression;
  readonly dimensionOf: (id: string) => Dimension;
  readonly unitOf?: (id: string) => string;
}

/**
 * Checks that both sides of an equation, and everything inside the right one, agree in their units.
 *
 * @returns null when they do; else the first place where they do not
 * @example checkEquation({ left: '1', expression: { root: { kind: 'pi', span: { from: 0, to: 1 } }, shown: 'π', stored: 'π', inputs: [] }, dimensionOf: () => { throw new Error() } }) // => null
 */
export function checkEquation(equation: Equation): ExpressionFault | null {
  const { expression, left } = equation;
  const unit = parseUnit(left);
  const whole = { from: 0, to: expression.shown.length };
  if (!unit.ok) return expressionFault(unit.code, unit.sentence, whole, unit.suggestions);
  const right = dimensionOf(expression, equation.dimensionOf, equation.unitOf);
  if (!right.ok) return right.fault;
  if (sameDimension(unit.unit.dimension, right.dimension)) return null;
  const units = [left, ...expression.inputs.map((id) => equation.unitOf?.(id) ?? '1')];
  const sides = [unit.unit.dimension, right.dimension].map((side) => dimensionWords(side, units));
  const hint = mismatchHint(unit.unit.dimension, right.dimension);
  const sentence = `Units do not agree. Left side is ${sides[0]}, right side is ${sides[1]}. ${hint}`;
  return expressionFault('dimension mismatch', sentence.trimEnd(), whole);
}
