import { buildNodes } from './build-nodes.ts';
import type { ExpressionFault, ExpressionNode, NamedSymbol, ParseResult, Span } from './expression.ts';
import type { Pieces } from './pieces.ts';
import { parsePlain } from './plain-parser.ts';
import { readPieces } from './read-pieces.ts';
import { SymbolTable } from './symbol-table.ts';
import { tokenise } from './tokenise.ts';
import { expressionFault } from './tokens.ts';

/** Longest text of an expression. */
const MAX_LENGTH = 2000;
/** Deepest nesting of operations; beyond it a formula is not for people. */
const MAX_DEPTH = 600;

/**
 * Reads an expression: numbers with or without units, symbols, `+ - * / ^`, comparisons, `a ? b : c` and a fixed
 * list of functions. Pasted signs (², ·, ×, −, √(…), |x|) are understood; what can be read in two ways is refused,
 * and both readings are offered. Nothing is ever run as program text.
 *
 * @param text - with symbols, or as kept with `{id}`, or a mix
 * @param symbols - every quantity that may be named
 * @returns the expression, or the first fault with its place in the shown text
 * @example parseExpression('C_v²*h', [{ id: 'q1', symbol: 'C_v' }, { id: 'q2', symbol: 'h' }]).expression.stored // => '{q1}²*{q2}'
 * @example parseExpression('sin x', [{ id: 'q1', symbol: 'x' }]).fault.sentence // => 'sin needs brackets, to show what it is of. Write sin(x).'
 */
export function parseExpression(text: string, symbols: readonly NamedSymbol[]): ParseResult {
  if (text.length > MAX_LENGTH) {
    const sentence = `A formula has at most ${MAX_LENGTH} signs; this one has ${text.length}. Split it.`;
    return refused(expressionFault('syntax', sentence, { from: MAX_LENGTH, to: text.length }), text);
  }
  const { tokens, shown, fault } = tokenise(text, symbols);
  const read = readPieces(tokens, shown, new SymbolTable(symbols));
  // A foreign sign is met after the tokens before it; the earlier fault is the one to mend first.
  if (!read.ok && (fault === null || read.fault.span.to < fault.span.from)) return refused(read.fault, shown);
  if (fault !== null) return refused(fault, shown);
  if (!read.ok) return refused(read.fault, shown);
  const parsed = parsePlain(read.pieces.text);
  if (!parsed.ok) {
    const place = placeOf(parsed.at, read.pieces);
    return refused(parsed.deep ? tooLong(place) : unfinished(place), shown);
  }
  const built = buildNodes(parsed.node, read.pieces);
  if (!built.ok) return refused(built.fault, shown);
  if (depthOf(built.node) > MAX_DEPTH) {
    return refused(tooLong(built.node.span), shown);
  }
  const stored = storedText(shown, read.pieces.edits);
  return { ok: true, expression: { root: built.node, shown, stored, inputs: inputsOf(built.node) } };
}

/** What the parser itself refuses: only an unfinished choice is left, all else was settled before. */
function unfinished(place: Span): ExpressionFault {
  const sentence = 'This cannot be read as a formula. A choice is written condition ? value : other value.';
  return expressionFault('syntax', sentence, place);
}

function tooLong(place: Span): ExpressionFault {
  return expressionFault('syntax', 'The formula is too long to read. Split it.', place);
}

function placeOf(at: number, pieces: Pieces): Span {
  const place = pieces.places.findLast((piece) => piece.at <= at) ?? pieces.places.at(-1);
  return place?.span ?? { from: 0, to: 1 };
}

function storedText(shown: string, edits: readonly { readonly span: Span; readonly text: string }[]): string {
  let stored = '';
  let at = 0;
  for (const { span, text } of edits) {
    stored += shown.slice(at, span.from) + text;
    at = span.to;
  }
  return stored + shown.slice(at);
}

function inputsOf(root: ExpressionNode): readonly string[] {
  const found = new Map<string, number>();
  const open: ExpressionNode[] = [root];
  for (let node = open.pop(); node !== undefined; node = open.pop()) {
    if (node.kind === 'symbol') found.set(node.id, Math.min(node.span.from, found.get(node.id) ?? Infinity));
    open.push(...childrenOf(node));
  }
  return [...found].sort((a, b) => a[1] - b[1]).map(([id]) => id);
}

function depthOf(root: ExpressionNode): number {
  let deepest = 0;
  const open = [{ node: root, depth: 1 }];
  for (let next = open.pop(); next !== undefined; next = open.pop()) {
    const { node, depth } = next;
    deepest = Math.max(deepest, depth);
    for (const child of childrenOf(node)) open.push({ node: child, depth: depth + 1 });
  }
  return deepest;
}

/** The nodes right below one. */
function childrenOf(node: ExpressionNode): readonly ExpressionNode[] {
  switch (node.kind) {
    case 'negative':
      return [node.of];
    case 'binary':
      return [node.left, node.right];
    case 'call':
      return node.inputs;
    case 'comparison':
      return node.terms;
    case 'choice':
      return [node.when, node.then, node.otherwise];
    default:
      return [];
  }
}

function refused(fault: ExpressionFault, shown: string): ParseResult {
  return { ok: false, fault, shown };
}
