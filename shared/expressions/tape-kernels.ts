import type { RealFunction } from './functions.ts';
import type { Operation } from './tape-program.ts';

/**
 * The arrays of one step. A stride is 1 for a column and 0 for one number, so that `a[k * sa]` is row k of either.
 * Slopes (`g…`) are always n long; null where the input cannot change with any active input.
 */
export interface StepFrame {
  readonly n: number;
  readonly real: RealFunction | null;
  readonly out: Float64Array;
  readonly so: number;
  readonly a: Float64Array;
  readonly sa: number;
  readonly b: Float64Array;
  readonly sb: number;
  readonly c: Float64Array;
  readonly sc: number;
  readonly g: Float64Array;
  readonly ga: Float64Array | null;
  readonly gb: Float64Array | null;
  readonly gc: Float64Array | null;
  /** Reached only through a choice: rows whose slope is nought were not chosen and must stay untouched. */
  readonly isGuarded: boolean;
}

/** Computes rows 0 … m−1 of `out`. */
export function runStep(operation: Operation, frame: StepFrame, m: number): void {
  const { out, a, sa, b, sb, c, sc } = frame;
  switch (operation) {
    case 'constant':
    case 'input':
      return;
    case 'negative':
      for (let k = 0; k < m; k += 1) out[k] = -at(a, k * sa);
      return;
    case 'add':
      for (let k = 0; k < m; k += 1) out[k] = at(a, k * sa) + at(b, k * sb);
      return;
    case 'subtract':
      for (let k = 0; k < m; k += 1) out[k] = at(a, k * sa) - at(b, k * sb);
      return;
    case 'multiply':
      for (let k = 0; k < m; k += 1) out[k] = at(a, k * sa) * at(b, k * sb);
      return;
    case 'divide':
      for (let k = 0; k < m; k += 1) out[k] = at(a, k * sa) / at(b, k * sb);
      return;
    case 'power':
      for (let k = 0; k < m; k += 1) out[k] = at(a, k * sa) ** at(b, k * sb);
      return;
    case 'square':
      for (let k = 0; k < m; k += 1) out[k] = at(a, k * sa) * at(a, k * sa);
      return;
    case 'inverse':
      for (let k = 0; k < m; k += 1) out[k] = 1 / at(a, k * sa);
      return;
    case 'root':
      for (let k = 0; k < m; k += 1) out[k] = Math.sqrt(at(a, k * sa));
      return;
    case 'function': {
      const value = frame.real?.value ?? notANumber;
      for (let k = 0; k < m; k += 1) out[k] = value(at(a, k * sa));
      return;
    }
    case 'smaller of':
      for (let k = 0; k < m; k += 1) out[k] = Math.min(at(a, k * sa), at(b, k * sb));
      return;
    case 'larger of':
      for (let k = 0; k < m; k += 1) out[k] = Math.max(at(a, k * sa), at(b, k * sb));
      return;
    case 'angle of':
      for (let k = 0; k < m; k += 1) out[k] = Math.atan2(at(a, k * sa), at(b, k * sb));
      return;
    case 'length of':
      for (let k = 0; k < m; k += 1) out[k] = Math.hypot(at(a, k * sa), at(b, k * sb));
      return;
    case 'both':
      for (let k = 0; k < m; k += 1) out[k] = at(a, k * sa) * at(b, k * sb);
      return;
    case 'choose':
      for (let k = 0; k < m; k += 1) {
        const when = at(a, k * sa);
        out[k] = Number.isNaN(when) ? NaN : when !== 0 ? at(b, k * sb) : at(c, k * sc);
      }
      return;
    default:
      for (let k = 0; k < m; k += 1) out[k] = compare(operation, at(a, k * sa), at(b, k * sb));
  }
}

/** Adds the slopes of `out` (in `g`) to those of what went in, row by row: the reverse of runStep. */
export function reverseStep(operation: Operation, frame: StepFrame): void {
  const { n, out, so, a, sa, b, sb, g, ga, gb, gc, isGuarded } = frame;
  switch (operation) {
    case 'negative':
      if (ga !== null) for (let k = 0; k < n; k += 1) add(ga, k, -at(g, k));
      return;
    case 'add':
      if (ga !== null) for (let k = 0; k < n; k += 1) add(ga, k, at(g, k));
      if (gb !== null) for (let k = 0; k < n; k += 1) add(gb, k, at(g, k));
      return;
    case 'subtract':
      if (ga !== null) for (let k = 0; k < n; k += 1) add(ga, k, at(g, k));
      if (gb !== null) for (let k = 0; k < n; k += 1) add(gb, k, -at(g, k));
      return;
    case 'multiply':
      if (ga !== null)
        for (let k = 0; k < n; k += 1) if (counts(g, k, isGuarded)) add(ga, k, at(g, k) * at(b, k * sb));
      if (gb !== null)
        for (let k = 0; k < n; k += 1) if (counts(g, k, isGuarded)) add(gb, k, at(g, k) * at(a, k * sa));
      return;
    case 'divide':
      if (ga !== null)
        for (let k = 0; k < n; k += 1) if (counts(g, k, isGuarded)) add(ga, k, at(g, k) / at(b, k * sb));
      if (gb !== null)
        for (let k = 0; k < n; k += 1)
          if (counts(g, k, isGuarded)) add(gb, k, (-at(g, k) * at(out, k * so)) / at(b, k * sb));
      return;
    case 'square':
      if (ga !== null)
        for (let k = 0; k < n; k += 1) if (counts(g, k, isGuarded)) add(ga, k, 2 * at(g, k) * at(a, k * sa));
      return;
    case 'root':
      if (ga !== null)
        for (let k = 0; k < n; k += 1)
          if (counts(g, k, isGuarded)) add(ga, k, (0.5 * at(g, k)) / at(out, k * so));
      return;
    case 'choose': {
      const { a: when, sa: sw } = frame;
      for (let k = 0; k < n; k += 1) {
        const chosen = at(when, k * sw) !== 0 ? gb : gc;
        if (chosen !== null) add(chosen, k, at(g, k));
      }
      return;
    }
    case 'smaller of':
      for (let k = 0; k < n; k += 1) choose(at(a, k * sa) <= at(b, k * sb) ? ga : gb, k, at(g, k));
      return;
    case 'larger of':
      for (let k = 0; k < n; k += 1) choose(at(a, k * sa) >= at(b, k * sb) ? ga : gb, k, at(g, k));
      return;
    case 'function': {
      const slope = frame.real?.slope ?? notANumber;
      if (ga === null) return;
      for (let k = 0; k < n; k += 1) {
        if (counts(g, k, isGuarded)) add(ga, k, at(g, k) * slope(at(a, k * sa), at(out, k * so)));
      }
      return;
    }
    default:
      for (let k = 0; k < n; k += 1) {
        if (!counts(g, k, isGuarded)) continue;
        const [x, y, z] = [at(a, k * sa), at(b, k * sb), at(out, k * so)];
        if (ga !== null) add(ga, k, at(g, k) * slopeOfFirst(operation, x, y, z));
        if (gb !== null) add(gb, k, at(g, k) * slopeOfSecond(operation, x, y, z));
      }
  }
}

/** A row that no choice took has slope nought, and must not meet an infinite one. */
function counts(g: Float64Array, k: number, isGuarded: boolean): boolean {
  return !isGuarded || g[k] !== 0;
}

function slopeOfFirst(operation: Operation, a: number, b: number, out: number): number {
  switch (operation) {
    case 'power':
      return b === 0 ? 0 : b * a ** (b - 1);
    case 'inverse':
      return -out * out;
    case 'angle of':
      return b / (a * a + b * b);
    case 'length of':
      return out === 0 ? 0 : a / out;
    default:
      // Comparisons step from 0 to 1: no slope on either side.
      return 0;
  }
}

function slopeOfSecond(operation: Operation, a: number, b: number, out: number): number {
  switch (operation) {
    case 'power':
      return a === 0 && b > 0 ? 0 : out * Math.log(a);
    case 'angle of':
      return -a / (a * a + b * b);
    case 'length of':
      return out === 0 ? 0 : b / out;
    default:
      return 0;
  }
}

function compare(operation: Operation, a: number, b: number): number {
  switch (operation) {
    case '<':
      return Number(a < b);
    case '<=':
      return Number(a <= b);
    case '>':
      return Number(a > b);
    case '>=':
      return Number(a >= b);
    case '==':
      return Number(a === b);
    case '!=':
      return Number(a !== b);
    default:
      return NaN;
  }
}

/** Indices are within bounds by construction; the fallback is never taken. */
function at(values: Float64Array, index: number): number {
  return values[index] ?? NaN;
}

function add(values: Float64Array, index: number, amount: number): void {
  values[index] = (values[index] ?? 0) + amount;
}

function choose(values: Float64Array | null, index: number, amount: number): void {
  if (values !== null) add(values, index, amount);
}

function notANumber(): number {
  return NaN;
}
