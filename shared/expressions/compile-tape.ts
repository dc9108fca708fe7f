import type { Expression } from './expression.ts';
import { reverseStep, runStep, type StepFrame } from './tape-kernels.ts';
import { writeProgram, type Program } from './tape-program.ts';

/**
 * An expression ready to be computed over many rows at once, with its derivatives. All values are in coherent SI.
 * Arrays given back are the tape's own and are overwritten by the next run: copy what must last.
 */
export interface Tape {
  /** Ids in the order that `run` takes their values. */
  readonly inputs: readonly string[];
  /** Ids in the order that `gradient` gives slopes. */
  readonly active: readonly string[];
  /**
   * Computes every row.
   *
   * @param columns - for each input its rows (length n), or one number for all rows
   * @param length - rows, n ≥ 0
   * @throws RangeError when the number of columns or a column's length is another
   */
  run(columns: readonly (Float64Array | number)[], length: number): Float64Array;
  /** Slopes of the last run with respect to each active input, row by row: each of length n. */
  gradient(): readonly Float64Array[];
}

/**
 * Compiles an expression into a tape: plain steps over arrays, reverse-mode derivatives, no generated program text.
 * Equal parts are computed once; parts that hold for all rows are computed once and not per row.
 *
 * @param inputs - ids whose values will be given; all that the expression names must be among them
 * @param active - ids whose derivatives are wanted; default all inputs
 * @throws RangeError when the expression names an id that is not among the inputs
 * @example compileTape({ root: { kind: 'symbol', id: 'x', span: { from: 0, to: 1 } }, shown: 'x', stored: '{x}', inputs: ['x'] }, ['x']).run([2], 1)[0] // => 2
 */
export function compileTape(
  expression: Expression,
  inputs: readonly string[],
  active: readonly string[] = inputs,
): Tape {
  return new ArrayTape(writeProgram(expression.root, inputs), inputs, active);
}

class ArrayTape implements Tape {
  /** For each step: may it change with an active input, and is it reached only through a choice? */
  private readonly isActive: readonly boolean[];
  private readonly isGuarded: readonly boolean[];
  private frames: StepFrame[] = [];
  private slopes: (Float64Array | null)[] = [];
  private result = new Float64Array(0);
  private shape = '';
  private n = 0;

  constructor(
    private readonly program: Program,
    readonly inputs: readonly string[],
    readonly active: readonly string[],
  ) {
    this.isActive = activeSteps(program, new Set(active.map((id) => inputs.indexOf(id))));
    this.isGuarded = guardedSteps(program);
  }

  run(columns: readonly (Float64Array | number)[], length: number): Float64Array {
    this.check(columns, length);
    this.prepare(columns, length);
    const { steps, root } = this.program;
    this.frames.forEach((frame, i) => {
      const step = steps[i];
      if (step !== undefined) runStep(step.operation, frame, frame.so === 0 ? 1 : length);
    });
    const last = this.frames[root];
    if (last === undefined) return this.result;
    if (last.so === 0) this.result.fill(last.out[0] ?? NaN);
    else this.result.set(last.out);
    return this.result;
  }

  gradient(): readonly Float64Array[] {
    const { steps, root } = this.program;
    for (const slope of this.slopes) slope?.fill(0);
    this.slopes[root]?.fill(1);
    for (let i = steps.length - 1; i >= 0; i -= 1) {
      const frame = this.frames[i];
      const step = steps[i];
      if (frame !== undefined && step !== undefined && this.isActive[i] === true) {
        reverseStep(step.operation, frame);
      }
    }
    return this.active.map((id) => {
      const index = this.inputs.indexOf(id);
      const at = steps.findIndex((step) => step.operation === 'input' && step.value === index);
      return this.slopes[at] ?? new Float64Array(this.n);
    });
  }

  private check(columns: readonly (Float64Array | number)[], length: number): void {
    if (columns.length !== this.inputs.length) {
      throw new RangeError(`Tape.run: needs ${this.inputs.length} columns, got ${columns.length}`);
    }
    for (const column of columns) {
      if (typeof column !== 'number' && column.length !== length) {
        throw new RangeError(`Tape.run: needs columns of ${length} rows, got ${column.length}`);
      }
    }
  }

  /** Makes the arrays anew when rows or the kind of an input changed; else only puts the new inputs in. */
  private prepare(columns: readonly (Float64Array | number)[], length: number): void {
    const shape = `${length}:${columns.map((column) => (typeof column === 'number' ? 's' : 'c')).join('')}`;
    if (shape !== this.shape) {
      this.shape = shape;
      this.n = length;
      this.result = new Float64Array(length);
      this.slopes = this.isActive.map((isActive) => (isActive ? new Float64Array(length) : null));
      this.frames = [];
    }
    const isSame = this.frames.length > 0 && this.putIn(columns);
    if (isSame) return;
    this.program.steps.forEach((step, i) => {
      const known = this.frames[i];
      this.frames[i] =
        step.operation === 'input'
          ? this.inputFrame(i, columns[step.value] ?? NaN)
          : this.frame(i, known?.out);
    });
  }

  /** Puts single numbers into the arrays that hold them; false when a column is another array than before. */
  private putIn(columns: readonly (Float64Array | number)[]): boolean {
    let isSame = true;
    this.program.steps.forEach((step, i) => {
      if (step.operation !== 'input') return;
      const column = columns[step.value];
      const held = this.frames[i]?.out;
      if (typeof column === 'number') held?.fill(column);
      else if (held !== column) isSame = false;
    });
    return isSame;
  }

  private inputFrame(index: number, column: Float64Array | number): StepFrame {
    const isColumn = typeof column !== 'number';
    return {
      ...EMPTY_FRAME,
      n: this.n,
      out: isColumn ? column : Float64Array.of(column),
      so: isColumn ? 1 : 0,
      g: this.slopes[index] ?? EMPTY,
    };
  }

  private frame(index: number, out: Float64Array | undefined): StepFrame {
    const step = this.program.steps[index];
    if (step === undefined) return EMPTY_FRAME;
    const parts = [step.a, step.b, step.c].map((part) => this.frames[part]);
    const so = parts.some((part) => part?.so === 1) ? 1 : 0;
    const [a, b, c] = parts;
    const constant = step.operation === 'constant' ? Float64Array.of(step.value) : undefined;
    return {
      n: this.n,
      real: step.real,
      out: out ?? constant ?? new Float64Array(so === 1 ? this.n : 1),
      so,
      a: a?.out ?? EMPTY,
      sa: a?.so ?? 0,
      b: b?.out ?? EMPTY,
      sb: b?.so ?? 0,
      c: c?.out ?? EMPTY,
      sc: c?.so ?? 0,
      g: this.slopes[index] ?? EMPTY,
      ga: this.slopes[step.a] ?? null,
      gb: this.slopes[step.b] ?? null,
      gc: this.slopes[step.c] ?? null,
      isGuarded: this.isGuarded[index] === true,
    };
  }
}

const EMPTY = new Float64Array(0);
const EMPTY_FRAME: StepFrame = {
  n: 0,
  real: null,
  out: EMPTY,
  so: 0,
  a: EMPTY,
  sa: 0,
  b: EMPTY,
  sb: 0,
  c: EMPTY,
  sc: 0,
  g: EMPTY,
  ga: null,
  gb: null,
  gc: null,
  isGuarded: false,
};

function activeSteps(program: Program, inputs: ReadonlySet<number>): readonly boolean[] {
  const isActive: boolean[] = [];
  program.steps.forEach(({ operation, a, b, c, value }, i) => {
    isActive[i] =
      operation === 'input' ? inputs.has(value) : [a, b, c].some((part) => isActive[part] === true);
  });
  return isActive;
}

/** Steps that only a choice, a smaller-of or a larger-of leads to. */
function guardedSteps({ steps, root }: Program): readonly boolean[] {
  const isOpen = new Array<boolean>(steps.length).fill(false);
  isOpen[root] = true;
  for (let i = steps.length - 1; i >= 0; i -= 1) {
    const step = steps[i];
    if (step === undefined || isOpen[i] !== true) continue;
    const { operation, a, b, c } = step;
    if (operation === 'smaller of' || operation === 'larger of') continue;
    for (const part of operation === 'choose' ? [a] : [a, b, c]) if (part >= 0) isOpen[part] = true;
  }
  return isOpen.map((open) => !open);
}
