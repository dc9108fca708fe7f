import type { ExpressionFault, ExpressionNode } from './expression.ts';
import { FUNCTIONS } from './functions.ts';
import { implicitProduct, type Follower, type Operand } from './implicit-product.ts';
import { PieceWriter } from './piece-writer.ts';
import type { SymbolTable } from './symbol-table.ts';
import {
  closingPlace,
  MAX_BRACKET_DEPTH,
  misplacedComma,
  misplacedSign,
  tooDeep,
  wrongCount,
} from './syntax-faults.ts';
import { expressionFault, type Token } from './tokens.ts';

interface Open {
  readonly kind: 'round' | 'call' | 'bar';
  readonly at: number;
  readonly call: number;
  /** A power written before the bracket, as in sin²(θ). */
  readonly power: number;
  readonly isDivisor: boolean;
  readonly isExponent: boolean;
  commas: number;
}

/**
 * Where reading has come to: the operand before, what stands before that, and the brackets still open. It reads
 * brackets, bars and commas; what stands between them is read by what extends it.
 */
export abstract class BracketReader {
  protected readonly writer = new PieceWriter();
  private readonly stack: Open[] = [];
  protected fault: ExpressionFault | null = null;
  /** The operand just read; null after an operator and at the start. */
  protected operand: Operand | null = null;
  protected behind = { isDivisor: false, isExponent: false };
  protected next = 0;

  constructor(
    protected readonly tokens: readonly Token[],
    protected readonly shown: string,
    protected readonly table: SymbolTable,
  ) {}

  protected openRound(token: Token): void {
    const close = closingPlace(this.tokens, this.next);
    const span = { from: token.span.from, to: close ?? token.span.to };
    if (!this.mayFollow({ kind: 'bracket', span, spaced: token.spaced })) return;
    this.writer.sign('(', token.span);
    this.open('round', token.span.from, 1, -1);
    this.next += 1;
  }

  protected open(kind: Open['kind'], at: number, power: number, call: number): void {
    this.stack.push({ kind, at, call, power, commas: 0, ...this.behind });
    this.operand = null;
    this.behind = { isDivisor: false, isExponent: false };
    if (this.stack.length > MAX_BRACKET_DEPTH) this.fail(tooDeep(at));
  }

  protected close(token: Token): void {
    const open = this.stack.pop();
    if (open === undefined || open.kind === 'bar') {
      return this.fail(expressionFault('syntax', 'A bracket is closed that was not opened.', token.span));
    }
    this.finish(open, token);
  }

  private finish(open: Open, token: Token): void {
    const span = { from: open.at, to: token.span.to };
    if (this.operand === null) {
      return this.fail(expressionFault('syntax', 'Something is missing before this bracket.', token.span));
    }
    const name = this.writer.functionOf(open.call);
    if (name === null) this.writer.closeRound(span);
    else {
      const fault = wrongCount(name, FUNCTIONS[name].inputs, open.commas + 1, span);
      if (fault !== null) return this.fail(fault);
      this.writer.closeCall(open.call, span, open.power);
    }
    this.operand = { kind: 'close', span, isDivisor: open.isDivisor, isExponent: open.isExponent };
    this.next += 1;
  }

  protected bar(token: Token): void {
    const top = this.stack.at(-1);
    if (top?.kind === 'bar' && this.operand !== null) {
      this.stack.pop();
      return this.finish(top, token);
    }
    if (!this.mayFollow({ kind: 'bar', span: token.span, spaced: token.spaced })) return;
    this.open('bar', token.span.from, 1, this.writer.openCall('abs', token.span, 1));
    this.next += 1;
  }

  protected comma(token: Token): void {
    const open = this.stack.at(-1);
    const name = open?.kind === 'call' ? this.writer.functionOf(open.call) : null;
    const mayHaveMore = name !== null && FUNCTIONS[name].inputs[1] > 1;
    if (open === undefined || !mayHaveMore)
      return this.fail(misplacedComma(this.tokens, this.next, this.shown));
    if (this.operand === null) return this.fail(misplacedSign('A comma', token.span));
    open.commas += 1;
    this.operand = null;
    this.behind = { isDivisor: false, isExponent: false };
    this.writer.sign(', ', token.span);
    this.next += 1;
  }

  /** Checks that an operand may stand here, and writes the product that is meant. */
  protected mayFollow(follower: Follower): boolean {
    if (this.operand === null) return true;
    const fault = implicitProduct(this.operand, follower, this.shown);
    if (fault !== null) {
      this.fail(fault);
      return false;
    }
    this.writer.sign(' * ', follower.span);
    this.behind = { isDivisor: false, isExponent: false };
    return true;
  }

  protected leaf(node: ExpressionNode, kind: Operand['kind']): void {
    this.writer.operand(node);
    this.operand = { kind, span: node.span, ...this.behind };
  }

  /** The bracket that was opened last and is not closed. */
  protected innermost(): { readonly kind: string; readonly at: number } | null {
    return this.stack.at(-1) ?? null;
  }

  protected fail(fault: ExpressionFault): void {
    this.fault ??= fault;
  }
}
