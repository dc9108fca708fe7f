import type { Expression, ExpressionNode } from './expression.ts';

/**
 * Puts other expressions in the place of symbols, so that a model's equations become one. Shown and stored text stay
 * those of the outer expression; the result is for computing, not for showing.
 *
 * @param replacement - expression for an id, or null to leave the symbol; replacements are themselves replaced in
 * @throws RangeError when an id is replaced by something that contains it
 * @example substitute({ root: { kind: 'symbol', id: 'a', span: { from: 0, to: 1 } }, shown: 'a', stored: '{a}', inputs: ['a'] }, () => null).inputs // => ['a']
 */
export function substitute(
  expression: Expression,
  replacement: (id: string) => Expression | null,
): Expression {
  const inputs = new Set<string>();
  const done = new Map<string, ExpressionNode>();
  const root = replaceIn(expression.root, (symbol) => replaced(symbol, replacement, done, inputs, new Set()));
  return { ...expression, root, inputs: [...inputs] };
}

type SymbolNode = Extract<ExpressionNode, { kind: 'symbol' }>;

function replaced(
  symbol: SymbolNode,
  replacement: (id: string) => Expression | null,
  done: Map<string, ExpressionNode>,
  inputs: Set<string>,
  open: ReadonlySet<string>,
): ExpressionNode {
  const { id } = symbol;
  if (open.has(id))
    throw new RangeError(`substitute: needs equations without a cycle, ${id} contains itself`);
  const known = done.get(id);
  if (known !== undefined) return known;
  const inner = replacement(id);
  if (inner === null) {
    inputs.add(id);
    return symbol;
  }
  const within = new Set([...open, id]);
  const node = replaceIn(inner.root, (deeper) => replaced(deeper, replacement, done, inputs, within));
  done.set(id, node);
  return node;
}

/** A tree with every symbol mapped; parts without symbols are kept as they are. */
function replaceIn(node: ExpressionNode, map: (symbol: SymbolNode) => ExpressionNode): ExpressionNode {
  const into = (part: ExpressionNode): ExpressionNode => replaceIn(part, map);
  switch (node.kind) {
    case 'symbol':
      return map(node);
    case 'negative':
      return { ...node, of: into(node.of) };
    case 'binary':
      return { ...node, left: into(node.left), right: into(node.right) };
    case 'call':
      return { ...node, inputs: node.inputs.map(into) };
    case 'comparison':
      return { ...node, terms: node.terms.map(into) };
    case 'choice':
      return { ...node, when: into(node.when), then: into(node.then), otherwise: into(node.otherwise) };
    default:
      return node;
  }
}
