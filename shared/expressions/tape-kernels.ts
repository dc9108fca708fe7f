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

/**
 * Computes rows 0 … m−1 of `out`.
 *
 * Elements are read in place, here and below, and indices are within bounds by construction: in functions as large
 * as these a reading function is no longer inlined, and every number it returns would be an object to collect.
 */
export function runStep(operation: Operation, frame: StepFrame, m: number): void {
  const { out, a, sa, b, sb, c, sc } = frame;
  switch (operation) {
    case 'constant':
    case 'input':
      return;
    case 'negative':
      for (let k = 0; k < m; k += 1) out[k] = -(a[k * sa] as number);
      return;
    case 'add':
      for (let k = 0; k < m; k += 1) out[k] = (a[k * sa] as number) + (b[k * sb] as number);
      return;
    case 'subtract':
      for (let k = 0; k < m; k += 1) out[k] = (a[k * sa] as number) - (b[k * sb] as number);
      return;
    case 'multiply':
      for (let k = 0; k < m; k += 1) out[k] = (a[k * sa] as number) * (b[k * sb] as number);
      return;
    case 'divide':
      for (let k = 0; k < m; k += 1) out[k] = (a[k * sa] as number) / (b[k * sb] as number);
      return;
    case 'power':
      for (let k = 0; k < m; k += 1) out[k] = (a[k * sa] as number) ** (b[k * sb] as number);
      return;
    case 'square':
      for (let k = 0; k < m; k += 1) out[k] = (a[k * sa] as number) * (a[k * sa] as number);
      return;
    case 'inverse':
      for (let k = 0; k < m; k += 1) out[k] = 1 / (a[k * sa] as number);
      return;
    case 'root':
      for (let k = 0; k < m; k += 1) out[k] = Math.sqrt(a[k * sa] as number);
      return;
    case 'function': {
      const value = frame.real?.value ?? notANumber;
      for (let k = 0; k < m; k += 1) out[k] = value(a[k * sa] as number);
      return;
    }
    case 'smaller of':
      for (let k = 0; k < m; k += 1) out[k] = Math.min(a[k * sa] as number, b[k * sb] as number);
      return;
    case 'larger of':
      for (let k = 0; k < m; k += 1) out[k] = Math.max(a[k * sa] as number, b[k * sb] as number);
      return;
    case 'angle of':
      for (let k = 0; k < m; k += 1) out[k] = Math.atan2(a[k * sa] as number, b[k * sb] as number);
      return;
    case 'length of':
      for (let k = 0; k < m; k += 1) out[k] = Math.hypot(a[k * sa] as number, b[k * sb] as number);
      return;
    case 'both':
      for (let k = 0; k < m; k += 1) out[k] = (a[k * sa] as number) * (b[k * sb] as number);
      return;
    case 'choose':
      for (let k = 0; k < m; k += 1) {
        const when = a[k * sa] as number;
        out[k] = Number.isNaN(when) ? NaN : when !== 0 ? (b[k * sb] as number) : (c[k * sc] as number);
      }
      return;
    default:
      for (let k = 0; k < m; k += 1) out[k] = compare(operation, a[k * sa] as number, b[k * sb] as number);
  }
}

/**
 * Adds the slopes of `out` (in `g`) to those of what went in, row by row: the reverse of runStep. A row that no
 * choice took has slope nought, and must not meet an infinite one.
 */
export function reverseStep(operation: Operation, frame: StepFrame): void {
  const { n, out, so, a, sa, b, sb, g, ga, gb, gc, isGuarded } = frame;
  switch (operation) {
    case 'negative':
      if (ga !== null) for (let k = 0; k < n; k += 1) ga[k] = (ga[k] as number) + -(g[k] as number);
      return;
    case 'add':
      if (ga !== null) for (let k = 0; k < n; k += 1) ga[k] = (ga[k] as number) + (g[k] as number);
      if (gb !== null) for (let k = 0; k < n; k += 1) gb[k] = (gb[k] as number) + (g[k] as number);
      return;
    case 'subtract':
      if (ga !== null) for (let k = 0; k < n; k += 1) ga[k] = (ga[k] as number) + (g[k] as number);
      if (gb !== null) for (let k = 0; k < n; k += 1) gb[k] = (gb[k] as number) + -(g[k] as number);
      return;
    case 'multiply':
      if (ga !== null)
        for (let k = 0; k < n; k += 1)
          if (!isGuarded || g[k] !== 0) ga[k] = (ga[k] as number) + (g[k] as number) * (b[k * sb] as number);
      if (gb !== null)
        for (let k = 0; k < n; k += 1)
          if (!isGuarded || g[k] !== 0) gb[k] = (gb[k] as number) + (g[k] as number) * (a[k * sa] as number);
      return;
    case 'divide':
      if (ga !== null)
        for (let k = 0; k < n; k += 1)
          if (!isGuarded || g[k] !== 0) ga[k] = (ga[k] as number) + (g[k] as number) / (b[k * sb] as number);
      if (gb !== null)
        for (let k = 0; k < n; k += 1)
          if (!isGuarded || g[k] !== 0)
            gb[k] = (gb[k] as number) + (-(g[k] as number) * (out[k * so] as number)) / (b[k * sb] as number);
      return;
    case 'square':
      if (ga !== null)
        for (let k = 0; k < n; k += 1)
          if (!isGuarded || g[k] !== 0)
            ga[k] = (ga[k] as number) + 2 * (g[k] as number) * (a[k * sa] as number);
      return;
    case 'root':
      if (ga !== null)
        for (let k = 0; k < n; k += 1)
          if (!isGuarded || g[k] !== 0)
            ga[k] = (ga[k] as number) + (0.5 * (g[k] as number)) / (out[k * so] as number);
      return;
    case 'choose': {
      const { a: when, sa: sw } = frame;
      for (let k = 0; k < n; k += 1) {
        const chosen = (when[k * sw] as number) !== 0 ? gb : gc;
        if (chosen !== null) add(chosen, k, g[k] as number);
      }
      return;
    }
    case 'smaller of':
      for (let k = 0; k < n; k += 1)
        choose((a[k * sa] as number) <= (b[k * sb] as number) ? ga : gb, k, g[k] as number);
      return;
    case 'larger of':
      for (let k = 0; k < n; k += 1)
        choose((a[k * sa] as number) >= (b[k * sb] as number) ? ga : gb, k, g[k] as number);
      return;
    case 'function': {
      const slope = frame.real?.slope ?? notANumber;
      if (ga === null) return;
      for (let k = 0; k < n; k += 1) {
        if (!isGuarded || g[k] !== 0)
          ga[k] = (ga[k] as number) + (g[k] as number) * slope(a[k * sa] as number, out[k * so] as number);
      }
      return;
    }
    default:
      for (let k = 0; k < n; k += 1) {
        if (isGuarded && g[k] === 0) continue;
        const [x, y, z] = [a[k * sa] as number, b[k * sb] as number, out[k * so] as number];
        if (ga !== null) ga[k] = (ga[k] as number) + (g[k] as number) * slopeOfFirst(operation, x, y, z);
        if (gb !== null) gb[k] = (gb[k] as number) + (g[k] as number) * slopeOfSecond(operation, x, y, z);
      }
  }
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

function add(values: Float64Array, index: number, amount: number): void {
  values[index] = (values[index] ?? 0) + amount;
}

function choose(values: Float64Array | null, index: number, amount: number): void {
  if (values !== null) add(values, index, amount);
}

function notANumber(): number {
  return NaN;
}
