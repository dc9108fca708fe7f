import type { ExpressionNode, Span } from './expression.ts';
import type { FunctionName } from './functions.ts';
import type { Pieces } from './pieces.ts';

/** Writes the plain text for the parser, and keeps what each of its names stands for. */
export class PieceWriter {
  private text = '';
  private readonly places: { at: number; span: Span }[] = [];
  private readonly leaves: ExpressionNode[] = [];
  private readonly calls: { name: FunctionName; span: Span }[] = [];
  private readonly brackets: Span[] = [];
  private readonly edits: { span: Span; text: string }[] = [];

  sign(text: string, span: Span): void {
    this.places.push({ at: this.text.length, span });
    this.text += text;
  }

  operand(node: ExpressionNode): void {
    this.leaves.push(node);
    this.sign(`t${this.leaves.length - 1}`, node.span);
  }

  /** A whole power that is written without an operator. */
  power(value: number, span: Span): void {
    this.sign('^', span);
    this.operand({ kind: 'number', text: String(value), value, exact: { n: BigInt(value), d: 1n }, span });
  }

  /** Opens a function's bracket; gives the number to close it by. */
  openCall(name: FunctionName, span: Span, power: number): number {
    this.calls.push({ name, span });
    const call = this.calls.length - 1;
    this.sign(power === 1 ? `f${call}(` : `(f${call}(`, span);
    return call;
  }

  closeCall(call: number, span: Span, power: number): void {
    const opened = this.calls[call];
    if (opened !== undefined) this.calls[call] = { ...opened, span };
    this.sign(')', span);
    if (power === 1) return;
    this.power(power, span);
    this.sign(')', span);
  }

  closeRound(span: Span): void {
    this.brackets.push(span);
    this.sign(')', span);
  }

  functionOf(call: number): FunctionName | null {
    return this.calls[call]?.name ?? null;
  }

  /** Notes what stands for a piece of shown text in the stored form. */
  edit(span: Span, text: string): void {
    this.edits.push({ span, text });
  }

  done(): Pieces {
    const { text, places, leaves, calls, brackets, edits } = this;
    return { text, places, leaves, calls, brackets, edits };
  }
}
