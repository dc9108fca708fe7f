import type { BinaryOperator, ComparisonOperator } from './expression.ts';

/** One node of a plain text's tree; `leaf` and `call` number the names `t0`, `f0` of the text (see pieces.ts). */
export type PlainNode =
  | { readonly kind: 'leaf'; readonly index: number }
  | { readonly kind: 'call'; readonly index: number; readonly inputs: readonly PlainNode[] }
  | { readonly kind: 'bracketed'; readonly of: PlainNode }
  | { readonly kind: 'signed'; readonly sign: '+' | '-'; readonly of: PlainNode }
  | {
      readonly kind: 'binary';
      readonly operator: BinaryOperator;
      readonly left: PlainNode;
      readonly right: PlainNode;
    }
  | {
      readonly kind: 'comparison';
      readonly operators: readonly ComparisonOperator[];
      readonly terms: readonly PlainNode[];
    }
  | {
      readonly kind: 'choice';
      readonly when: PlainNode;
      readonly then: PlainNode;
      readonly otherwise: PlainNode;
    };

/** The tree, or where reading stopped. */
export type PlainResult =
  | { readonly ok: true; readonly node: PlainNode }
  /** `at` is the position in the plain text, from 0; `deep`: nested beyond MAX_NESTING. */
  | { readonly ok: false; readonly at: number; readonly deep: boolean };

/** Brackets, signs, powers and choices within one another; far beyond what is written, far below what a stack holds. */
const MAX_NESTING = 500;

/**
 * Reads a plain text (see pieces.ts) into a tree, by recursive descent with one function for each rank of sign. From
 * the loosest to the tightest: a choice, comparisons (chained), sums, products, a leading sign, powers. Products and
 * sums group from the left, powers and choices from the right; `-x^2` is −(x²), `2^-x` is allowed.
 *
 * Source: the usual precedence of arithmetic signs; tests compare the tree with an independent parser's on random texts.
 *
 * @example parsePlain('t0 + t1 * t2').ok // => true
 * @example parsePlain('t0 ? t1') // => { ok: false, at: 7, deep: false }
 */
export function parsePlain(text: string): PlainResult {
  try {
    return { ok: true, node: new PlainReader(text).whole() };
  } catch (error) {
    if (error instanceof Unreadable) return { ok: false, at: error.at, deep: error.deep };
    throw error;
  }
}

/** Carries the place out of the recursion; never leaves this file. */
class Unreadable extends Error {
  constructor(
    readonly at: number,
    readonly deep: boolean,
  ) {
    super('unreadable');
  }
}

const WORD = /\s*(t\d+|f\d+|[<>=!]=|\S|$)/y;
const COMPARISONS: ReadonlySet<string> = new Set<ComparisonOperator>(['<', '<=', '>', '>=', '==', '!=']);
const SUMS: ReadonlySet<string> = new Set<BinaryOperator>(['+', '-']);
const PRODUCTS: ReadonlySet<string> = new Set<BinaryOperator>(['*', '/']);

class PlainReader {
  private word = '';
  private at = 0;
  private end = 0;
  private nesting = 0;

  constructor(private readonly text: string) {
    this.move();
  }

  whole(): PlainNode {
    const node = this.choice();
    if (this.word !== '') throw this.unreadable();
    return node;
  }

  private choice(): PlainNode {
    return this.nested(() => {
      const when = this.comparison();
      if (!this.take('?')) return when;
      const then = this.choice();
      this.expect(':');
      return { kind: 'choice', when, then, otherwise: this.choice() };
    });
  }

  private comparison(): PlainNode {
    const first = this.grouped(SUMS, () => this.product());
    const operators: ComparisonOperator[] = [];
    const terms = [first];
    while (COMPARISONS.has(this.word)) {
      operators.push(this.word as ComparisonOperator);
      this.move();
      terms.push(this.grouped(SUMS, () => this.product()));
    }
    return operators.length === 0 ? first : { kind: 'comparison', operators, terms };
  }

  private product(): PlainNode {
    return this.grouped(PRODUCTS, () => this.signed());
  }

  /** Operands with signs of one rank between them, grouped from the left. */
  private grouped(signs: ReadonlySet<string>, operand: () => PlainNode): PlainNode {
    let left = operand();
    while (signs.has(this.word)) {
      const operator = this.word as BinaryOperator;
      this.move();
      left = { kind: 'binary', operator, left, right: operand() };
    }
    return left;
  }

  private signed(): PlainNode {
    const { word } = this;
    if (word !== '+' && word !== '-') return this.power();
    this.move();
    return { kind: 'signed', sign: word, of: this.nested(() => this.signed()) };
  }

  private power(): PlainNode {
    const left = this.operand();
    if (!this.take('^')) return left;
    return { kind: 'binary', operator: '^', left, right: this.nested(() => this.signed()) };
  }

  private operand(): PlainNode {
    const { word } = this;
    const index = Number(word.slice(1));
    if (word.length > 1 && word.startsWith('t')) {
      this.move();
      return { kind: 'leaf', index };
    }
    if (word.length > 1 && word.startsWith('f')) {
      this.move();
      return { kind: 'call', index, inputs: this.inputs() };
    }
    this.expect('(');
    const of = this.choice();
    this.expect(')');
    return { kind: 'bracketed', of };
  }

  private inputs(): readonly PlainNode[] {
    this.expect('(');
    const inputs = [this.choice()];
    while (this.take(',')) inputs.push(this.choice());
    this.expect(')');
    return inputs;
  }

  private nested(read: () => PlainNode): PlainNode {
    this.nesting += 1;
    if (this.nesting > MAX_NESTING) throw new Unreadable(this.at, true);
    const node = read();
    this.nesting -= 1;
    return node;
  }

  private take(word: string): boolean {
    if (this.word !== word) return false;
    this.move();
    return true;
  }

  private expect(word: string): void {
    if (!this.take(word)) throw this.unreadable();
  }

  private move(): void {
    WORD.lastIndex = this.end;
    const found = WORD.exec(this.text);
    this.word = found?.[1] ?? '';
    this.end = WORD.lastIndex;
    this.at = this.end - this.word.length;
  }

  private unreadable(): Unreadable {
    return new Unreadable(this.at, false);
  }
}
