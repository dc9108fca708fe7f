import type { ExpressionNode } from './expression.ts';
import { findFunction, type FunctionName } from './functions.ts';
import type { PiecesResult } from './pieces.ts';
import { readMeasure, readUnitAlone } from './read-measure.ts';
import { unknownNameFault, type SymbolTable } from './symbol-table.ts';
import { expressionFault, type Token } from './tokens.ts';
import { BracketReader } from './bracket-reader.ts';
import { callHead } from './call-head.ts';
import {
  functionWithoutBracket,
  misplacedSign,
  powerOfPower,
  unfinished,
  unitBehind,
} from './syntax-faults.ts';

const OPERATORS = new Set(['+', '-', '*', '/', '^', '<', '<=', '>', '>=', '==', '!=', '?', ':']);

/**
 * Reads tokens from left to right, settles what each name means and where a product is meant, and writes the plain
 * text for the parser. The first fault ends it.
 */
export function readPieces(tokens: readonly Token[], shown: string, table: SymbolTable): PiecesResult {
  return new PieceReader(tokens, shown, table).read();
}

class PieceReader extends BracketReader {
  read(): PiecesResult {
    while (this.fault === null && this.next < this.tokens.length) {
      const token = this.tokens[this.next];
      if (token !== undefined) this.step(token);
    }
    this.fault ??= unfinished(this.tokens, this.shown, this.innermost(), this.operand !== null);
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
      this.place({ kind: 'pi', span: token.span }, token.spaced);
      return;
    }
    const open = this.tokens[this.next + 1];
    this.fail(unknownNameFault(token, open, this.table, this.operand?.kind === 'number'));
  }

  private symbol(id: string, token: Token): void {
    if (!this.place({ kind: 'symbol', id, span: token.span }, token.spaced)) return;
    this.writer.edit(token.span, `{${id}}`);
  }

  /** Writes one sign that stands for a value, if it may stand here. */
  private place(node: ExpressionNode, spaced: boolean): boolean {
    if (!this.mayFollow({ kind: 'symbol', span: node.span, spaced })) return false;
    this.leaf(node, 'symbol');
    this.next += 1;
    return true;
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
}
