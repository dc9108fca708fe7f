import { rationalToNumber } from '#shared/numeric/rational.ts';
import { exactConstant } from './exact-constant.ts';
import type { ComparisonOperator, ExpressionNode } from './expression.ts';
import { FUNCTIONS, type FunctionName, type RealFunction } from './functions.ts';

/** What one step of a tape does. */
export type Operation =
  | 'constant'
  | 'input'
  | 'negative'
  | 'add'
  | 'subtract'
  | 'multiply'
  | 'divide'
  | 'power'
  | 'square'
  | 'inverse'
  | 'root'
  | 'function'
  | 'smaller of'
  | 'larger of'
  | 'angle of'
  | 'length of'
  | ComparisonOperator
  | 'both'
  | 'choose';

/** One step: up to three earlier steps go in, one value for each row comes out. */
export interface Step {
  readonly operation: Operation;
  readonly a: number;
  readonly b: number;
  readonly c: number;
  /** Value of a constant, or index of an input. */
  readonly value: number;
  readonly real: RealFunction | null;
}

/** Steps in an order that can be run; equal parts of the expression are one step. The last one is the result. */
export interface Program {
  readonly steps: readonly Step[];
  readonly root: number;
}

const NONE = -1;

/** Writes the steps of an expression. Constants are folded; common powers become products and roots. */
export function writeProgram(root: ExpressionNode, inputs: readonly string[]): Program {
  const writer = new ProgramWriter(inputs);
  const last = writer.of(root);
  return { steps: writer.steps, root: last };
}

class ProgramWriter {
  readonly steps: Step[] = [];
  private readonly known = new Map<string, number>();
  private readonly done = new Map<ExpressionNode, number>();

  constructor(private readonly inputs: readonly string[]) {}

  of(node: ExpressionNode): number {
    const earlier = this.done.get(node);
    if (earlier !== undefined) return earlier;
    const step = this.write(node);
    this.done.set(node, step);
    return step;
  }

  private write(node: ExpressionNode): number {
    switch (node.kind) {
      case 'number':
      case 'measure':
        return this.constant(node.value);
      case 'pi':
        return this.constant(Math.PI);
      case 'symbol':
        return this.input(node.id);
      case 'negative':
        return this.step('negative', this.of(node.of));
      case 'binary':
        return this.binary(node);
      case 'call':
        return this.call(node.name, node.inputs);
      case 'comparison':
        return this.comparison(node);
      case 'choice':
        return this.step('choose', this.of(node.when), this.of(node.then), this.of(node.otherwise));
    }
  }

  private input(id: string): number {
    const index = this.inputs.indexOf(id);
    if (index < 0) throw new RangeError(`compileTape: needs every quantity among its inputs, ${id} is not`);
    return this.step('input', NONE, NONE, NONE, index);
  }

  private binary(node: Extract<ExpressionNode, { kind: 'binary' }>): number {
    const folded = exactConstant(node);
    if (folded !== null) return this.constant(rationalToNumber(folded));
    const left = this.of(node.left);
    const right = this.of(node.right);
    switch (node.operator) {
      case '+':
        return this.step('add', left, right);
      case '-':
        return this.step('subtract', left, right);
      case '*':
        return this.step('multiply', left, right);
      case '/':
        return this.step('divide', left, right);
      case '^':
        return this.power(left, right);
    }
  }

  private power(base: number, exponent: number): number {
    const known = this.steps[exponent];
    if (known?.operation !== 'constant') return this.step('power', base, exponent);
    const square = (of: number): number => this.step('square', of);
    const inverse = (of: number): number => this.step('inverse', of);
    switch (known.value) {
      case 1:
        return base;
      case 2:
        return square(base);
      case 3:
        return this.step('multiply', square(base), base);
      case 4:
        return square(square(base));
      case -1:
        return inverse(base);
      case -2:
        return inverse(square(base));
      case 0.5:
        return this.step('root', base);
      case -0.5:
        return inverse(this.step('root', base));
      default:
        return this.step('power', base, exponent);
    }
  }

  private call(name: FunctionName, inputs: readonly ExpressionNode[]): number {
    const [first = this.constant(NaN), ...rest] = inputs.map((input) => this.of(input));
    const { real } = FUNCTIONS[name];
    if (name === 'sqrt') return this.step('root', first);
    if (real !== null) return this.step('function', first, NONE, NONE, 0, real, name);
    const operation = SEVERAL[name];
    if (operation === undefined) throw new TypeError(`compileTape: cannot compute ${name}`);
    return rest.reduce((left, right) => this.step(operation, left, right), first);
  }

  private comparison(node: Extract<ExpressionNode, { kind: 'comparison' }>): number {
    const terms = node.terms.map((term) => this.of(term));
    const pairs = node.operators.map((operator, i) =>
      this.step(operator, terms[i] ?? NONE, terms[i + 1] ?? NONE),
    );
    const [first = this.constant(1), ...rest] = pairs;
    return rest.reduce((left, right) => this.step('both', left, right), first);
  }

  private constant(value: number): number {
    return this.step('constant', NONE, NONE, NONE, value);
  }

  private step(
    operation: Operation,
    a: number,
    b = NONE,
    c = NONE,
    value = 0,
    real: RealFunction | null = null,
    name = '',
  ): number {
    const key = `${operation} ${a} ${b} ${c} ${Object.is(value, -0) ? '-0' : value} ${name}`;
    const earlier = this.known.get(key);
    if (earlier !== undefined) return earlier;
    this.steps.push({ operation, a, b, c, value, real });
    this.known.set(key, this.steps.length - 1);
    return this.steps.length - 1;
  }
}

const SEVERAL: Partial<Readonly<Record<FunctionName, Operation>>> = {
  min: 'smaller of',
  max: 'larger of',
  atan2: 'angle of',
  hypot: 'length of',
};
