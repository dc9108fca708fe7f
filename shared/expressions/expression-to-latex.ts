import { decimalToText, parseDecimal } from '#shared/numeric/decimal.ts';
import { figuresToLatex } from '#shared/formatting/scalar-latex.ts';
import { unitGapLatex, unitToLatex } from '#shared/formatting/unit-latex.ts';
import type { ComparisonOperator, Expression, ExpressionNode } from './expression.ts';
import { callPart, raisedPart } from './latex-call.ts';
import { atLeast, BINDING, givenPart, latexPart, type LatexPart } from './latex-part.ts';
import { fractionPart, productPart } from './latex-product.ts';

/** How an expression is set. */
export interface LatexOptions {
  /** LaTeX of a quantity's symbol. */
  readonly symbol: (id: string) => string;
  /** LaTeX to put in a symbol's place, perhaps in \htmlClass{…}{…}; null keeps the symbol. */
  readonly put?: (id: string) => string | null;
}

/**
 * An expression as a printed formula: fractions, roots, powers at the function's name, juxtaposed factors, brackets
 * only where they are needed. With `put`, numbers stand in the places of symbols, with dots between.
 *
 * @example expressionToLatex({ root: { kind: 'symbol', id: 'q1', span: { from: 0, to: 1 } }, shown: 'θ', stored: '{q1}', inputs: ['q1'] }, { symbol: () => '\\theta' }) // => '\\theta'
 */
export function expressionToLatex(expression: Expression, options: LatexOptions): string {
  return new LatexWriter(options).of(expression.root).latex;
}

const COMPARISONS: Readonly<Record<ComparisonOperator, string>> = {
  '<': '<',
  '<=': '\\le ',
  '>': '>',
  '>=': '\\ge ',
  '==': '=',
  '!=': '\\ne ',
};

class LatexWriter {
  constructor(private readonly options: LatexOptions) {}

  of(node: ExpressionNode): LatexPart {
    switch (node.kind) {
      case 'number':
        return numberPart(node.text);
      case 'measure':
        return givenPart(numberPart(node.text).latex + unitGapLatex(node.unit) + unitToLatex(node.unit));
      case 'pi':
        return latexPart('\\pi');
      case 'symbol':
        return givenPart(this.options.put?.(node.id) ?? this.options.symbol(node.id));
      case 'negative':
        return this.negative(node.of);
      case 'binary':
        return this.binary(node);
      case 'call':
        return callPart(
          node.name,
          node.inputs.map((input) => this.of(input)),
          null,
        );
      case 'comparison':
        return this.comparison(node);
      case 'choice':
        return this.choice(node);
    }
  }

  private negative(node: ExpressionNode): LatexPart {
    const of = atLeast(this.of(node), BINDING.product);
    const held = of.startsWithSign ? `(${of.latex})` : of.latex;
    const { ends, isTall } = of;
    return latexPart(`-${held}`, { binding: BINDING.sum, startsWithSign: true, kind: 'other', ends, isTall });
  }

  private binary(node: Extract<ExpressionNode, { kind: 'binary' }>): LatexPart {
    const unsigned = withoutSign(node);
    if (unsigned !== null) return this.negative(unsigned);
    switch (node.operator) {
      case '+':
      case '-':
        return this.sum(node);
      case '*':
        return productPart(factorsOf(node).map((factor) => this.of(factor)));
      case '/':
        return fractionPart(this.of(node.left), this.of(node.right));
      case '^':
        return this.power(node.left, node.right);
    }
  }

  private sum(node: Extract<ExpressionNode, { kind: 'binary' }>): LatexPart {
    const left = atLeast(this.of(node.left), BINDING.sum);
    const plain = this.of(node.right);
    const needsMore = node.operator === '-' || plain.startsWithSign;
    const right = atLeast(plain, needsMore ? BINDING.product : BINDING.sum);
    const held = right.startsWithSign && right.kind === 'figure' ? `(${right.latex})` : right.latex;
    return latexPart(`${left.latex}${node.operator}${held}`, {
      binding: BINDING.sum,
      startsWithFigure: left.startsWithFigure,
      startsWithSign: left.startsWithSign,
      ends: right.ends,
      kind: 'other',
      isTall: left.isTall || right.isTall,
    });
  }

  private power(base: ExpressionNode, exponent: ExpressionNode): LatexPart {
    const power = this.exponent(exponent);
    if (base.kind === 'call' && exponent.kind === 'number') {
      return callPart(
        base.name,
        base.inputs.map((input) => this.of(input)),
        power,
      );
    }
    return raisedPart(this.of(base), power);
  }

  /** A fraction of two signs or numbers stays in the line: x^{1/3}, a^{b/c}. */
  private exponent(node: ExpressionNode): string {
    const whole = this.of(node);
    if (node.kind !== 'binary' || node.operator !== '/' || whole.kind !== 'fraction') return whole.latex;
    const [top, bottom] = [this.of(node.left), this.of(node.right)];
    const areAtoms = [top, bottom].every((part) => part.binding === BINDING.atom && !part.isTall);
    return areAtoms ? `${top.latex}/${bottom.latex}` : whole.latex;
  }

  private comparison(node: Extract<ExpressionNode, { kind: 'comparison' }>): LatexPart {
    const terms = node.terms.map((term) => atLeast(this.of(term), BINDING.sum));
    const latex = terms.map((term, i) => {
      const operator = node.operators[i];
      return term.latex + (operator === undefined ? '' : COMPARISONS[operator]);
    });
    const isTall = terms.some((term) => term.isTall);
    return latexPart(latex.join(''), { binding: BINDING.comparison, kind: 'other', isTall });
  }

  private choice(node: Extract<ExpressionNode, { kind: 'choice' }>): LatexPart {
    const rows: string[] = [];
    let rest: ExpressionNode = node;
    while (rest.kind === 'choice') {
      rows.push(`${this.of(rest.then).latex} & \\text{if } ${this.of(rest.when).latex}`);
      rest = rest.otherwise;
    }
    rows.push(`${this.of(rest).latex} & \\text{otherwise}`);
    const latex = `\\begin{cases}${rows.join(' \\\\ ')}\\end{cases}`;
    return latexPart(latex, { binding: BINDING.choice, kind: 'other', isTall: true });
  }
}

/** a*b*c as one list, however it was bracketed on the left. */
function factorsOf(node: ExpressionNode): readonly ExpressionNode[] {
  return node.kind === 'binary' && node.operator === '*'
    ? [...factorsOf(node.left), ...factorsOf(node.right)]
    : [node];
}

/** −t/τ is set as the opposite of t/τ: the sign of a first factor goes before the whole. */
function withoutSign(node: ExpressionNode): ExpressionNode | null {
  if (node.kind === 'negative') return node.of;
  if (node.kind !== 'binary' || (node.operator !== '*' && node.operator !== '/')) return null;
  const left = withoutSign(node.left);
  return left === null ? null : { ...node, left };
}

/** 2e-3 is set as 2×10^{-3}. */
function numberPart(text: string): LatexPart {
  const [mantissa = '', exponent] = text.toLowerCase().split('e');
  const decimal = parseDecimal(mantissa);
  const figures = figuresToLatex(decimal === null ? mantissa : decimalToText(decimal));
  const latex = exponent === undefined ? figures : `${figures}\\times 10^{${Number(exponent)}}`;
  return latexPart(latex, {
    startsWithFigure: true,
    ends: exponent === undefined ? 'figure' : 'unit',
    kind: 'figure',
    binding: exponent === undefined ? BINDING.atom : BINDING.product,
  });
}
