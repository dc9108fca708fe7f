/**
 * The tree of a plain text, compared with that of an independent parser (mathjs 15, number build) on random texts:
 * the precedence of arithmetic signs that everybody expects, from code that is not ours.
 */
import fc from 'fast-check';
import { create, parseDependencies } from 'mathjs/number';
import { describe, expect, test } from 'vitest';
import { parsePlain, type PlainNode } from '#shared/expressions/plain-parser.ts';

/** As much of the other parser's tree as is compared. */
interface OtherNode {
  readonly type: string;
  readonly name?: string;
  readonly op?: string;
  readonly fn?: { readonly name: string };
  readonly args?: readonly OtherNode[];
  readonly content?: OtherNode;
  readonly condition?: OtherNode;
  readonly trueExpr?: OtherNode;
  readonly falseExpr?: OtherNode;
  readonly conditionals?: readonly string[];
  readonly params?: readonly OtherNode[];
}

const { parse } = create(parseDependencies ?? {});
const SIGNS: Readonly<Record<string, string>> = {
  smaller: '<',
  smallerEq: '<=',
  larger: '>',
  largerEq: '>=',
  equal: '==',
  unequal: '!=',
};

function theirs(text: string): string | null {
  try {
    return shownOther(parse(text) as unknown as OtherNode);
  } catch {
    return null;
  }
}

function shownOther(node: OtherNode | undefined): string {
  const all = (nodes: readonly OtherNode[] | undefined) => (nodes ?? []).map(shownOther);
  switch (node?.type) {
    case 'SymbolNode':
      return node.name ?? '';
    case 'ParenthesisNode':
      return `[${shownOther(node.content)}]`;
    case 'OperatorNode':
      return node.args?.length === 1
        ? `{${node.op}${all(node.args)[0]}}`
        : `{${all(node.args).join(String(node.op))}}`;
    case 'FunctionNode':
      return `${node.fn?.name}(${all(node.args).join(',')})`;
    case 'RelationalNode': {
      const signs = (node.conditionals ?? []).map((name) => SIGNS[name] ?? name);
      return `{${all(node.params)
        .map((term, i) => term + (signs[i] ?? ''))
        .join('')}}`;
    }
    case 'ConditionalNode':
      return `{${all([node.condition, node.trueExpr, node.falseExpr] as OtherNode[]).join('?')}}`;
    default:
      return `another node: ${node?.type}`;
  }
}

function ours(text: string): string | null {
  const parsed = parsePlain(text);
  return parsed.ok ? shown(parsed.node) : null;
}

function shown(node: PlainNode): string {
  switch (node.kind) {
    case 'leaf':
      return `t${node.index}`;
    case 'bracketed':
      return `[${shown(node.of)}]`;
    case 'signed':
      return `{${node.sign}${shown(node.of)}}`;
    case 'binary':
      return `{${shown(node.left)}${node.operator}${shown(node.right)}}`;
    case 'call':
      return `f${node.index}(${node.inputs.map(shown).join(',')})`;
    case 'comparison':
      return `{${node.terms.map((term, i) => shown(term) + (node.operators[i] ?? '')).join('')}}`;
    case 'choice':
      return `{${[node.when, node.then, node.otherwise].map(shown).join('?')}}`;
  }
}

/**
 * Texts that are well formed, with brackets only here and there, so that precedence decides. What a choice gives when
 * it is met stands in brackets: the other parser refuses a choice within a choice there.
 */
const formula = fc.letrec<{ text: string }>((tie) => ({
  text: fc.oneof(
    { maxDepth: 5, withCrossShrink: true },
    fc.nat(9).map((i) => `t${i}`),
    fc
      .tuple(
        tie('text'),
        fc.constantFrom('+', '-', '*', '/', '^', '<', '<=', '>', '>=', '==', '!='),
        tie('text'),
      )
      .map(([left, sign, right]) => `${left} ${sign} ${right}`),
    fc.tuple(fc.constantFrom('-', '+'), tie('text')).map(([sign, of]) => `${sign}${of}`),
    tie('text').map((of) => `(${of})`),
    fc
      .tuple(fc.nat(3), fc.array(tie('text'), { minLength: 1, maxLength: 3 }))
      .map(([i, inputs]) => `f${i}(${inputs.join(', ')})`),
    fc
      .tuple(tie('text'), tie('text'), tie('text'))
      .map(([when, then, otherwise]) => `${when} ? (${then}) : ${otherwise}`),
  ),
})).text;

describe('parsePlain', () => {
  test('random formulas: have the tree that the other parser gives them', () => {
    fc.assert(
      fc.property(formula, (text) => {
        expect(ours(text)).toBe(theirs(text));
      }),
      { seed: 1648, numRuns: 3000 },
    );
  });

  // The other parser also knows ranges (t0:t1), factorials, calls of values and empty calls; none can be in a plain text.
  test('random signs without a choice: are refused where the other parser refuses them', () => {
    const word = fc.constantFrom('t0', 't1', '+', '-', '*', '/', '^', '<', '==', '(', ')');
    fc.assert(
      fc.property(fc.array(word, { minLength: 1, maxLength: 9 }), (words) => {
        const text = words.join(' ');
        fc.pre(!/[)\d] (?:t|\()/.test(text));
        expect(ours(text)).toBe(theirs(text));
      }),
      { seed: 1648, numRuns: 3000 },
    );
  });

  test.each([
    ['t0 ? t1', 7],
    ['t0 ? t1 : ', 10],
    ['t0 : t1', 3],
    ['t0 t1', 3],
    ['(t0', 3],
    ['', 0],
  ])('%s: stops at %d', (text, at) => {
    expect(parsePlain(text)).toEqual({ ok: false, at, deep: false });
  });

  test('brackets nested beyond reason: are refused, and the stack is not exhausted', () => {
    const text = '('.repeat(900) + 't0' + ')'.repeat(900);

    expect(parsePlain(text)).toMatchObject({ ok: false, deep: true });
  });
});
