import { readSi } from '#shared/units/reading.ts';
import type {
  BinaryOperator,
  ComparisonOperator,
  ExpressionFault,
  ExpressionNode,
  Span,
} from './expression.ts';
import type { ParserNode } from './plain-parser.ts';
import type { Pieces } from './pieces.ts';
import { expressionFault } from './tokens.ts';

/** The tree, or the part of the text that makes none. */
export type NodeResult =
  | { readonly ok: true; readonly node: ExpressionNode }
  | { readonly ok: false; readonly fault: ExpressionFault };

const COMPARISONS: Readonly<Record<string, ComparisonOperator>> = {
  smaller: '<',
  smallerEq: '<=',
  larger: '>',
  largerEq: '>=',
  equal: '==',
  unequal: '!=',
};

/** Turns the parser's tree into our nodes: names become what they stand for, and every node gets its place. */
export function buildNodes(root: ParserNode, pieces: Pieces): NodeResult {
  try {
    return { ok: true, node: new NodeBuilder(pieces).build(root) };
  } catch (error) {
    if (error instanceof UnusablePart) return { ok: false, fault: error.fault };
    throw error;
  }
}

/** Carries a fault out of the recursion; never leaves this file. */
class UnusablePart extends Error {
  constructor(readonly fault: ExpressionFault) {
    super(fault.sentence);
  }
}

class NodeBuilder {
  constructor(private readonly pieces: Pieces) {}

  build(node: ParserNode): ExpressionNode {
    switch (node.type) {
      case 'SymbolNode':
        return this.leaf(node);
      case 'ParenthesisNode':
        return this.bracketed(this.build(required(node.content)));
      case 'OperatorNode':
        return this.operator(node);
      case 'FunctionNode':
        return this.call(node);
      case 'RelationalNode':
        return this.chain(node);
      case 'ConditionalNode':
        return this.choice(node);
      default:
        throw new UnusablePart(
          expressionFault('syntax', 'This cannot be read as a formula.', { from: 0, to: this.end() }),
        );
    }
  }

  private leaf(node: ParserNode): ExpressionNode {
    return required(this.pieces.leaves[indexOf(node.name)]);
  }

  private operator(node: ParserNode): ExpressionNode {
    const [first, second] = required(node.args);
    const left = this.build(required(first));
    if (second === undefined) {
      return node.op === '-' ? negated(left, this.fromSignBefore(left.span)) : left;
    }
    const right = this.build(second);
    const span = joined(left.span, right.span);
    const operator = required(node.op);
    if (isComparison(operator))
      return { kind: 'comparison', operators: [operator], terms: [left, right], span };
    const affine = affineFault(operator, left, right, span);
    if (affine !== null) throw new UnusablePart(affine);
    return { kind: 'binary', operator: operator as BinaryOperator, left, right, span };
  }

  private call(node: ParserNode): ExpressionNode {
    const { fn } = node;
    const { name, span } = required(this.pieces.calls[indexOf(typeof fn === 'string' ? fn : fn?.name)]);
    return { kind: 'call', name, inputs: required(node.args).map((input) => this.build(input)), span };
  }

  private chain(node: ParserNode): ExpressionNode {
    const terms = required(node.params).map((term) => this.build(term));
    const operators = required(node.conditionals).map((name) => required(COMPARISONS[name]));
    const span = joined(required(terms[0]).span, required(terms.at(-1)).span);
    return { kind: 'comparison', operators, terms, span };
  }

  private choice(node: ParserNode): ExpressionNode {
    const when = this.build(required(node.condition));
    const then = this.build(required(node.trueExpr));
    const otherwise = this.build(required(node.falseExpr));
    return { kind: 'choice', when, then, otherwise, span: joined(when.span, otherwise.span) };
  }

  /** The place of what is in brackets takes the brackets in. */
  private bracketed(node: ExpressionNode): ExpressionNode {
    const around = this.pieces.brackets
      .filter(({ from, to }) => from < node.span.from && to > node.span.to)
      .sort((a, b) => a.to - a.from - (b.to - b.from))[0];
    return around === undefined ? node : { ...node, span: around };
  }

  private fromSignBefore(span: Span): Span {
    const sign = this.pieces.places.findLast(
      ({ at, span: own }) => own.to <= span.from && this.pieces.text.slice(at).trimStart().startsWith('-'),
    );
    return { from: sign?.span.from ?? span.from, to: span.to };
  }

  private end(): number {
    return this.pieces.places.at(-1)?.span.to ?? 0;
  }
}

/** −20 °C is a point on the scale, not the opposite of 20 °C. */
function negated(of: ExpressionNode, span: Span): ExpressionNode {
  if (of.kind !== 'measure' || !of.affine || of.text.startsWith('-')) return { kind: 'negative', of, span };
  const reading = readSi({ text: `-${of.text}`, unit: of.unit });
  return reading.ok
    ? { ...of, text: `-${of.text}`, value: reading.value, span }
    : { kind: 'negative', of, span };
}

/** What °C allows: one may be added to, compared and subtracted, but neither doubled nor added to another. */
function affineFault(
  operator: string,
  left: ExpressionNode,
  right: ExpressionNode,
  span: Span,
): ExpressionFault | null {
  const points = [left, right].filter((node) => node.kind === 'measure' && node.affine);
  const [, second] = points;
  if (points.length === 0 || operator === '-') return null;
  if (operator === '+' && second === undefined) return null;
  const sentence =
    operator === '+'
      ? 'Two temperatures in °C cannot be added. Write the difference in K, like 20 [°C] + 5 [K].'
      : 'A temperature in °C has its own zero and cannot be multiplied, divided or raised. Write it in K.';
  return expressionFault('ambiguous text', sentence, span);
}

function isComparison(operator: string): operator is ComparisonOperator {
  return Object.values(COMPARISONS).some((known) => known === operator);
}

function indexOf(name: string | undefined): number {
  return Number(name?.slice(1));
}

function joined(a: Span, b: Span): Span {
  return { from: Math.min(a.from, b.from), to: Math.max(a.to, b.to) };
}

function required<T>(value: T | undefined): T {
  if (value === undefined) throw new TypeError('buildNodes: the parser gave a tree of another form');
  return value;
}
