import { create, parseDependencies } from 'mathjs/number';

/** The parser's tree, as much of it as is used here. It is only looked at, never evaluated. */
export interface ParserNode {
  readonly type: string;
  readonly name?: string;
  readonly op?: string;
  readonly fn?: string | { readonly name: string };
  readonly args?: readonly ParserNode[];
  readonly content?: ParserNode;
  readonly condition?: ParserNode;
  readonly trueExpr?: ParserNode;
  readonly falseExpr?: ParserNode;
  readonly conditionals?: readonly string[];
  readonly params?: readonly ParserNode[];
}

/** The parser's tree, or where it stopped. */
export type ParserResult =
  | { readonly ok: true; readonly node: ParserNode }
  /** `at` is the position in the plain text, from 0. */
  | { readonly ok: false; readonly at: number };

const { parse } = create(parseDependencies ?? {});

/**
 * Parses a plain text (see pieces.ts) into a tree.
 *
 * @example parsePlain('t0 + t1 * t2').ok // => true
 * @example parsePlain('t0 ? t1') // => { ok: false, at: 7 }
 */
export function parsePlain(text: string): ParserResult {
  try {
    return { ok: true, node: parse(text) as unknown as ParserNode };
  } catch (error) {
    if (error instanceof Error && 'char' in error) return { ok: false, at: Number(error.char) - 1 };
    // Thousands of signs nested into one another exhaust the stack.
    if (error instanceof RangeError) return { ok: false, at: 0 };
    throw error;
  }
}
