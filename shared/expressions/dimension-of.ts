import { rational } from '#shared/numeric/rational.ts';
import {
  ANGLE,
  DIMENSIONLESS,
  divideDimensions,
  isDimensionless,
  multiplyDimensions,
  powerDimension,
  sameDimension,
  type Dimension,
} from '#shared/units/dimension.ts';
import { dimensionWords, mismatchHint } from './dimension-words.ts';
import { exactConstant } from './exact-constant.ts';
import type { DimensionResult, Expression, ExpressionFault, ExpressionNode } from './expression.ts';
import { FUNCTIONS, type FunctionName } from './functions.ts';
import { expressionFault } from './tokens.ts';

/**
 * What kind of quantity an expression gives, or where in it units do not agree.
 *
 * @param dimensionOfInput - dimension of each quantity it names
 * @param unitOfInput - unit each is shown in, so that sentences speak of cm where the team does
 * @example dimensionOf({ root: { kind: 'pi', span: { from: 0, to: 1 } }, shown: 'π', stored: 'π', inputs: [] }, () => { throw new Error() }).ok // => true
 */
export function dimensionOf(
  expression: Expression,
  dimensionOfInput: (id: string) => Dimension,
  unitOfInput: (id: string) => string = () => '1',
): DimensionResult {
  const checker = new DimensionChecker(expression, dimensionOfInput, expression.inputs.map(unitOfInput));
  const dimension = checker.of(expression.root);
  return checker.fault === null ? { ok: true, dimension } : { ok: false, fault: checker.fault };
}

class DimensionChecker {
  fault: ExpressionFault | null = null;

  constructor(
    private readonly expression: Expression,
    private readonly dimensionOfInput: (id: string) => Dimension,
    private readonly units: readonly string[],
  ) {}

  of(node: ExpressionNode): Dimension {
    switch (node.kind) {
      case 'number':
      case 'pi':
        return DIMENSIONLESS;
      case 'measure':
        return node.dimension;
      case 'symbol':
        return this.dimensionOfInput(node.id);
      case 'negative':
        return this.of(node.of);
      case 'binary':
        return this.binary(node);
      case 'call':
        return this.call(node);
      case 'comparison':
        this.agree(node.terms, node);
        return DIMENSIONLESS;
      case 'choice': {
        this.pure(node.when, 'A choice', 'a comparison before the question mark');
        return this.agree([node.then, node.otherwise], node);
      }
    }
  }

  private binary(node: Extract<ExpressionNode, { kind: 'binary' }>): Dimension {
    switch (node.operator) {
      case '+':
      case '-':
        return this.agree([node.left, node.right], node);
      case '*':
        return multiplyDimensions(this.of(node.left), this.of(node.right));
      case '/':
        return divideDimensions(this.of(node.left), this.of(node.right));
      case '^':
        return this.power(node.left, node.right, node);
    }
  }

  private power(base: ExpressionNode, exponent: ExpressionNode, node: ExpressionNode): Dimension {
    const dimension = this.of(base);
    this.pure(exponent, 'A power', 'a pure number as its exponent');
    const exact = exactConstant(exponent);
    if (exact !== null) return powerDimension(dimension, exact);
    if (!isDimensionless(dimension)) {
      const sentence = `${this.text(base)} is in ${this.words(dimension)}, so its power must be a number that stands in the formula, like 2 or 1/3. Divide it by a scale of its own kind first.`;
      this.fail(sentence, node);
    }
    return DIMENSIONLESS;
  }

  private call(node: Extract<ExpressionNode, { kind: 'call' }>): Dimension {
    const [first] = node.inputs;
    if (first === undefined) return DIMENSIONLESS;
    const { rule } = FUNCTIONS[node.name];
    switch (rule) {
      case 'pure':
        this.pure(first, node.name, 'a pure number');
        return DIMENSIONLESS;
      case 'of angle':
        this.pure(first, node.name, 'an angle or a pure number');
        return DIMENSIONLESS;
      case 'to angle':
        this.pure(first, node.name, 'a pure number');
        return ANGLE;
      case 'square root':
        return powerDimension(this.of(first), rational(1n, 2n));
      case 'cube root':
        return powerDimension(this.of(first), rational(1n, 3n));
      case 'keeps':
        return this.of(first);
      case 'sign':
        this.of(first);
        return DIMENSIONLESS;
      case 'same':
        return this.agree(node.inputs, node);
      case 'angle of two':
        this.agree(node.inputs, node);
        return ANGLE;
    }
  }

  /** All parts must be of one kind. */
  private agree(parts: readonly ExpressionNode[], node: ExpressionNode): Dimension {
    const [first = DIMENSIONLESS, ...others] = parts.map((part) => this.of(part));
    const other = others.find((dimension) => !sameDimension(first, dimension));
    if (other !== undefined) {
      const hint = isDimensionless(first) || isDimensionless(other) ? '' : ` ${mismatchHint(first, other)}`;
      const sides = `Left side is ${this.words(first)}, right side is ${this.words(other)}.`;
      this.fail(`Units do not agree in ${this.text(node)}. ${sides}${hint.trimEnd()}`, node);
    }
    return first;
  }

  private pure(node: ExpressionNode, who: FunctionName | string, wanted: string): void {
    const dimension = this.of(node);
    if (isDimensionless(dimension)) return;
    const sentence = `${who} needs ${wanted}, and ${this.text(node)} is in ${this.words(dimension)}. Divide it by a scale of its own kind first.`;
    this.fail(sentence, node);
  }

  private words(dimension: Dimension): string {
    return dimensionWords(dimension, this.units);
  }

  private text({ span }: ExpressionNode): string {
    return `“${this.expression.shown.slice(span.from, span.to)}”`;
  }

  private fail(sentence: string, node: ExpressionNode): void {
    this.fault ??= expressionFault('dimension mismatch', sentence, node.span);
  }
}
