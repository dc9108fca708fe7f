/** What a function asks of its inputs and what it gives back. */
export type FunctionRule =
  /** pure number → pure number */
  | 'pure'
  /** angle or pure number → pure number */
  | 'of angle'
  /** pure number → angle */
  | 'to angle'
  /** anything → its square root, its cube root */
  | 'square root'
  | 'cube root'
  /** anything → the same kind */
  | 'keeps'
  /** anything → pure number */
  | 'sign'
  /** several of one kind → that kind */
  | 'same'
  /** two of one kind → angle */
  | 'angle of two';

/** A function of one number with its derivative; `slope` is given the input and the value already computed. */
export interface RealFunction {
  readonly value: (x: number) => number;
  readonly slope: (x: number, y: number) => number;
}

interface FunctionFacts {
  readonly rule: FunctionRule;
  /** Fewest and most inputs. */
  readonly inputs: readonly [number, number];
  /** null for functions of several inputs, which the tape computes itself. */
  readonly real: RealFunction | null;
}

const facts = {
  sqrt: one('square root', Math.sqrt, (_, y) => 0.5 / y),
  cbrt: one('cube root', Math.cbrt, (_, y) => 1 / (3 * y * y)),
  exp: one('pure', Math.exp, (_, y) => y),
  expm1: one('pure', Math.expm1, (_, y) => y + 1),
  log: one('pure', Math.log, (x) => 1 / x),
  log1p: one('pure', Math.log1p, (x) => 1 / (1 + x)),
  log10: one('pure', Math.log10, (x) => 1 / (x * Math.LN10)),
  log2: one('pure', Math.log2, (x) => 1 / (x * Math.LN2)),
  sin: one('of angle', Math.sin, (x) => Math.cos(x)),
  cos: one('of angle', Math.cos, (x) => -Math.sin(x)),
  tan: one('of angle', Math.tan, (_, y) => 1 + y * y),
  asin: one('to angle', Math.asin, (x) => 1 / Math.sqrt((1 - x) * (1 + x))),
  acos: one('to angle', Math.acos, (x) => -1 / Math.sqrt((1 - x) * (1 + x))),
  atan: one('to angle', Math.atan, (x) => 1 / (1 + x * x)),
  sinh: one('pure', Math.sinh, (x) => Math.cosh(x)),
  cosh: one('pure', Math.cosh, (x) => Math.sinh(x)),
  tanh: one('pure', Math.tanh, (_, y) => (1 - y) * (1 + y)),
  asinh: one('pure', Math.asinh, (x) => 1 / Math.hypot(x, 1)),
  acosh: one('pure', Math.acosh, (x) => 1 / Math.sqrt((x - 1) * (x + 1))),
  atanh: one('pure', Math.atanh, (x) => 1 / ((1 - x) * (1 + x))),
  // At its corner |x| has no slope; 1 keeps the size of an uncertainty.
  abs: one('keeps', Math.abs, (x) => (x < 0 ? -1 : 1)),
  sign: one('sign', Math.sign, () => 0),
  min: { rule: 'same', inputs: [2, 20], real: null },
  max: { rule: 'same', inputs: [2, 20], real: null },
  hypot: { rule: 'same', inputs: [2, 2], real: null },
  atan2: { rule: 'angle of two', inputs: [2, 2], real: null },
} as const satisfies Record<string, FunctionFacts>;

/** Name of a function that expressions may use; `ln`, `arcsin`, … are read as `log`, `asin`, …. */
export type FunctionName = keyof typeof facts;

/** The fixed list of functions. `log` is the natural logarithm. */
export const FUNCTIONS: Readonly<Record<FunctionName, FunctionFacts>> = facts;

const OTHER_NAMES: Readonly<Record<string, FunctionName>> = {
  ln: 'log',
  lg: 'log10',
  arcsin: 'asin',
  arccos: 'acos',
  arctan: 'atan',
  arsinh: 'asinh',
  arcosh: 'acosh',
  artanh: 'atanh',
  sgn: 'sign',
  '√': 'sqrt',
};

/**
 * The function that a name stands for, or null.
 *
 * @example findFunction('ln') // => 'log'
 * @example findFunction('f') // => null
 */
export function findFunction(name: string): FunctionName | null {
  const known = OTHER_NAMES[name] ?? name;
  return Object.hasOwn(FUNCTIONS, known) ? (known as FunctionName) : null;
}

/** Every name that a function may be written with, for suggestions. */
export const FUNCTION_NAMES: readonly string[] = [...Object.keys(FUNCTIONS), ...Object.keys(OTHER_NAMES)];

function one(
  rule: FunctionRule,
  value: RealFunction['value'],
  slope: RealFunction['slope'],
): FunctionFacts & { readonly real: RealFunction } {
  return { rule, inputs: [1, 1], real: { value, slope } };
}
