import type { ExpressionFault, ExpressionNode } from './expression.ts';
import { findFunction, FUNCTIONS, type FunctionName } from './functions.ts';
import { implicitProduct, type Follower, type Operand } from './implicit-product.ts';
import type { PiecesResult } from './pieces.ts';
import { readMeasure, readUnitAlone } from './read-measure.ts';
import { unknownName, type SymbolTable } from './symbol-table.ts';
import { expressionFault, type Token } from './tokens.ts';
import { PieceWriter } from './piece-writer.ts';
import { callHead } from './call-head.ts';
import {
  closingPlace,
  functionWithoutBracket,
  misplacedComma,
  MAX_BRACKET_DEPTH,
  misplacedSign,
  powerOfPower,
  tooDeep,
  unfinished,
  unitBehind,
  wrongCount,
} from './syntax-faults.ts';

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

const OPERATORS = new Set(['+', '-', '*', '/', '^', '<', '<=', '>', '>=', '==', '!=', '?', ':']);

/**
 * Reads tokens from left to right, settles what each name means and where a product is meant, and writes the plain
 * text for the parser. The first fault ends it.
 */
export function readPieces(tokens: readonly Token[], shown: string, table: SymbolTable): PiecesResult {
  return new PieceReader(tokens, shown, table).read();
}

class PieceReader {
  private readonly writer = new PieceWriter();
  private readonly stack: Open[] = [];
  private fault: ExpressionFault | null = null;
  /** The operand just read; null after an operator and at the start. */
  private operand: Operand | null = null;
  private behind = { isDivisor: false, isExponent: false };
  private next = 0;

  constructor(
    private readonly tokens: readonly Token[],
    private readonly shown: string,
    private readonly table: SymbolTable,
  ) {}

  read(): PiecesResult {
    while (this.fault === null && this.next < this.tokens.length) {
      const token = this.tokens[this.next];
      if (token !== undefined) this.step(token);
    }
    this.fault ??= unfinished(this.tokens, this.shown, this.stack.at(-1) ?? null, this.operand !== null);
    if (this.fault !== null) return { ok: false, fault: this.fault };
    return { ok: true, pieces: this.writer.done() };
  }

  private step(token: Token): void {
    switch (token.kind) {
      case 'number':
        return this.number();
      case 'name':
        return this.name(token);
      case 'id':
        return this.symbol(token.id, token);
      case 'raised':
        return this.raised(token);
      case 'unit':
        return this.unit(token);
      case 'sign':
        return this.sign(token.text, token);
    }
  }

  private number(): void {
    const token = this.tokens[this.next];
    const measured = readMeasure(this.tokens, this.next, this.shown, this.table);
    if (token === undefined) return;
    if (!measured.ok) return this.fail(measured.fault);
    const { node, used, stored } = measured;
    if (!this.mayFollow({ kind: 'number', span: node.span, spaced: token.spaced })) return;
    if (node.kind === 'measure') {
      const { isDivisor, isExponent } = this.behind;
      if (isDivisor || isExponent) return this.fail(unitBehind(node, stored, isDivisor, this.shown));
      this.writer.edit(node.span, stored);
    }
    this.leaf(node, node.kind === 'measure' ? 'measure' : 'number');
    this.next += used;
  }

  private name(token: Token & { kind: 'name' }): void {
    const name = findFunction(token.text);
    const symbol = this.table.find(token.text);
    if (name !== null && symbol === null) return this.call(name, token);
    if (symbol !== null) return this.symbol(symbol, token);
    if (token.text === 'π' || token.text === 'pi') {
      if (!this.mayFollow({ kind: 'symbol', span: token.span, spaced: token.spaced })) return;
      this.leaf({ kind: 'pi', span: token.span }, 'symbol');
      this.next += 1;
      return;
    }
    const open = this.tokens[this.next + 1];
    const isCalled = open?.kind === 'sign' && open.text === '(';
    const isAfterNumber = this.operand?.kind === 'number';
    const { code, sentence, suggestions } = unknownName(token.text, isCalled, this.table, isAfterNumber);
    this.fail(expressionFault(code ?? 'unknown symbol', sentence, token.span, suggestions));
  }

  private symbol(id: string, token: Token): void {
    if (!this.mayFollow({ kind: 'symbol', span: token.span, spaced: token.spaced })) return;
    this.writer.edit(token.span, `{${id}}`);
    this.leaf({ kind: 'symbol', id, span: token.span }, 'symbol');
    this.next += 1;
  }

  /** A function, perhaps with a power of its own: sin(θ), sin²(θ), sin^2(θ). */
  private call(name: FunctionName, token: Token & { kind: 'name' }): void {
    const { open, power, isOpen } = callHead(this.tokens, this.next);
    if (!isOpen || power < 1) {
      return this.fail(functionWithoutBracket(this.tokens, this.next, open, power, this.shown));
    }
    if (!this.mayFollow({ kind: 'function', span: token.span, spaced: token.spaced })) return;
    this.open('call', token.span.from, power, this.writer.openCall(name, token.span, power));
    this.next = open + 1;
  }

  private raised(token: Token & { kind: 'raised' }): void {
    const { operand } = this;
    if (operand === null) return this.fail(misplacedSign('A raised figure', token.span));
    if (operand.isExponent) return this.fail(powerOfPower(token.span));
    this.writer.power(token.power, token.span);
    const span = { from: operand.span.from, to: token.span.to };
    this.operand = { ...operand, kind: 'close', span };
    this.next += 1;
  }

  /** A unit behind a bracket, as in (1/2) [m]; behind a number it was read with it. */
  private unit(token: Token & { kind: 'unit' }): void {
    if (this.operand?.kind !== 'close') {
      const sentence = `A unit in brackets stands right after a number. Write 1 [${token.text}] or the number before it.`;
      return this.fail(expressionFault('syntax', sentence, token.span, [`1 [${token.text}]`]));
    }
    if (!this.mayFollow({ kind: 'unit', span: token.span, spaced: false })) return;
    const measured = readUnitAlone(token, this.tokens.slice(this.next + 1, this.next + 3));
    if (!measured.ok) return this.fail(measured.fault);
    this.leaf(measured.node, 'measure');
    this.next += 1;
  }

  private sign(sign: string, token: Token): void {
    if (sign === '(') return this.openRound(token);
    if (sign === ')') return this.close(token);
    if (sign === '|') return this.bar(token);
    if (sign === ',') return this.comma(token);
    if (!OPERATORS.has(sign)) return this.fail(misplacedSign(sign, token.span));
    if (this.operand === null && sign !== '-' && sign !== '+') {
      return this.fail(misplacedSign(`“${sign}”`, token.span));
    }
    if (this.operand !== null) {
      const isPower = sign === '^';
      const isDivisor = sign === '/' || (isPower && this.operand.isDivisor);
      this.behind = { isDivisor, isExponent: isPower };
    }
    this.operand = null;
    this.writer.sign(` ${sign} `, token.span);
    this.next += 1;
  }

  private openRound(token: Token): void {
    const close = closingPlace(this.tokens, this.next);
    const span = { from: token.span.from, to: close ?? token.span.to };
    if (!this.mayFollow({ kind: 'bracket', span, spaced: token.spaced })) return;
    this.writer.sign('(', token.span);
    this.open('round', token.span.from, 1, -1);
    this.next += 1;
  }

  private open(kind: Open['kind'], at: number, power: number, call: number): void {
    this.stack.push({ kind, at, call, power, commas: 0, ...this.behind });
    this.operand = null;
    this.behind = { isDivisor: false, isExponent: false };
    if (this.stack.length > MAX_BRACKET_DEPTH) this.fail(tooDeep(at));
  }

  private close(token: Token): void {
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

  private bar(token: Token): void {
    const top = this.stack.at(-1);
    if (top?.kind === 'bar' && this.operand !== null) {
      this.stack.pop();
      return this.finish(top, token);
    }
    if (!this.mayFollow({ kind: 'bar', span: token.span, spaced: token.spaced })) return;
    this.open('bar', token.span.from, 1, this.writer.openCall('abs', token.span, 1));
    this.next += 1;
  }

  private comma(token: Token): void {
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
  private mayFollow(follower: Follower): boolean {
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

  private leaf(node: ExpressionNode, kind: Operand['kind']): void {
    this.writer.operand(node);
    this.operand = { kind, span: node.span, ...this.behind };
  }

  private fail(fault: ExpressionFault): void {
    this.fault ??= fault;
  }
}
