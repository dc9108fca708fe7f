import { readSi } from '#shared/units/reading.ts';
import type { BinaryOperator, ExpressionFault, ExpressionNode, Span } from './expression.ts';
import type { PlainNode } from './plain-parser.ts';
import type { Pieces } from './pieces.ts';
import { expressionFault } from './tokens.ts';

/** The tree, or the part of the text that makes none. */
export type NodeResult =
  | { readonly ok: true; readonly node: ExpressionNode }
  | { readonly ok: false; readonly fault: ExpressionFault };

/** Turns the parser's tree into our nodes: names become what they stand for, and every node gets its place. */
export function buildNodes(root: PlainNode, pieces: Pieces): NodeResult {
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

  build(node: PlainNode): ExpressionNode {
    switch (node.kind) {
      case 'leaf':
        return required(this.pieces.leaves[node.index]);
      case 'bracketed':
        return this.bracketed(this.build(node.of));
      case 'signed': {
        const of = this.build(node.of);
        return node.sign === '-' ? negated(of, this.fromSignBefore(of.span)) : of;
      }
      case 'binary':
        return this.binary(node.operator, this.build(node.left), this.build(node.right));
      case 'call': {
        const { name, span } = required(this.pieces.calls[node.index]);
        return { kind: 'call', name, inputs: node.inputs.map((input) => this.build(input)), span };
      }
      case 'comparison': {
        const terms = node.terms.map((term) => this.build(term));
        const span = joined(required(terms[0]).span, required(terms.at(-1)).span);
        return { kind: 'comparison', operators: node.operators, terms, span };
      }
      case 'choice': {
        const [when, then, otherwise] = [node.when, node.then, node.otherwise].map((part) =>
          this.build(part),
        );
        const span = joined(required(when).span, required(otherwise).span);
        return {
          kind: 'choice',
          when: required(when),
          then: required(then),
          otherwise: required(otherwise),
          span,
        };
      }
    }
  }

  private binary(operator: BinaryOperator, left: ExpressionNode, right: ExpressionNode): ExpressionNode {
    const span = joined(left.span, right.span);
    const affine = affineFault(operator, left, right, span);
    if (affine !== null) throw new UnusablePart(affine);
    return { kind: 'binary', operator, left, right, span };
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
  operator: BinaryOperator,
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

function joined(a: Span, b: Span): Span {
  return { from: Math.min(a.from, b.from), to: Math.max(a.to, b.to) };
}

function required<T>(value: T | undefined): T {
  if (value === undefined) throw new TypeError('buildNodes: needs the tree of these pieces');
  return value;
}
