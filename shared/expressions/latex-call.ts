import type { FunctionName } from './functions.ts';
import { atLeast, BINDING, inBrackets, latexPart, type LatexPart } from './latex-part.ts';

/** Functions that are set by name before their input, and the name. */
const NAMED: Partial<Readonly<Record<FunctionName, string>>> = {
  log: '\\ln',
  log10: '\\log_{10}',
  log2: '\\log_{2}',
  sin: '\\sin',
  cos: '\\cos',
  tan: '\\tan',
  asin: '\\arcsin',
  acos: '\\arccos',
  atan: '\\arctan',
  sinh: '\\sinh',
  cosh: '\\cosh',
  tanh: '\\tanh',
  asinh: '\\operatorname{arsinh}',
  acosh: '\\operatorname{arcosh}',
  atanh: '\\operatorname{artanh}',
  sign: '\\operatorname{sgn}',
  min: '\\min',
  max: '\\max',
  atan2: '\\operatorname{atan2}',
};

/**
 * A function of its inputs, as it is printed: `\sin 2\theta`, `\sqrt{…}`, `\left|x\right|`, `\mathrm{e}^{…}`.
 *
 * @param power - a whole power of the whole, set at the name where that is usual: `\sin^{2}\theta`
 */
export function callPart(name: FunctionName, inputs: readonly LatexPart[], power: string | null): LatexPart {
  const part = special(name, inputs);
  if (part !== null) return power === null ? part : raisedPart(part, power);
  const named = NAMED[name] ?? `\\operatorname{${name}}`;
  const [first] = inputs;
  const head = power === null ? named : /_/u.test(named) ? null : `${named}^{${power}}`;
  if (head === null) return raisedPart(callPart(name, inputs, null), power ?? '');
  if (inputs.length === 1 && first !== undefined && mayStandOpen(first)) {
    const ends = 'open function';
    return latexPart(`${head} ${first.latex}`, {
      kind: 'function',
      binding: BINDING.product,
      ends,
      isTall: first.isTall,
    });
  }
  const isTall = inputs.some((input) => input.isTall);
  const list = inputs.map(({ latex }) => latex).join(', ');
  const bracket = isTall ? `\\left(${list}\\right)` : `(${list})`;
  return latexPart(head + bracket, { kind: 'function', binding: BINDING.power, isTall });
}

/**
 * A base with its power, in brackets unless it is one sign or one plain number.
 *
 * @param power - LaTeX of the exponent
 */
export function raisedPart(base: LatexPart, power: string): LatexPart {
  const isPlain = base.binding === BINDING.atom && base.kind !== 'fraction' && base.ends !== 'unit';
  const held = isPlain ? base : inBrackets(base);
  return latexPart(`${held.latex}^{${power}}`, {
    binding: BINDING.power,
    startsWithFigure: held.startsWithFigure,
    startsWithSign: held.startsWithSign,
    kind: 'other',
    isTall: held.isTall || power.includes('\\frac'),
  });
}

function special(name: FunctionName, inputs: readonly LatexPart[]): LatexPart | null {
  const [first = latexPart(''), second = latexPart('')] = inputs;
  switch (name) {
    case 'sqrt':
      return latexPart(`\\sqrt{${first.latex}}`, { kind: 'root', isTall: true });
    case 'cbrt':
      return latexPart(`\\sqrt[3]{${first.latex}}`, { kind: 'root', isTall: true });
    case 'abs':
      return latexPart(first.isTall ? `\\left|${first.latex}\\right|` : `|${first.latex}|`, {
        kind: 'bracket',
        isTall: first.isTall,
      });
    case 'exp':
      return exponential(first);
    case 'expm1':
      return latexPart(`${exponential(first).latex}-1`, {
        binding: BINDING.sum,
        kind: 'other',
        isTall: first.isTall,
      });
    case 'log1p': {
      const inside = `1+${atLeast(first, BINDING.product).latex}`;
      const bracket = first.isTall ? `\\left(${inside}\\right)` : `(${inside})`;
      return latexPart(`\\ln${bracket}`, { kind: 'function', binding: BINDING.power, isTall: first.isTall });
    }
    case 'hypot':
      return latexPart(`\\sqrt{${raisedPart(first, '2').latex}+${raisedPart(second, '2').latex}}`, {
        kind: 'root',
        isTall: true,
      });
    default:
      return null;
  }
}

function exponential(input: LatexPart): LatexPart {
  return input.isTall
    ? latexPart(`\\exp\\left(${input.latex}\\right)`, {
        kind: 'function',
        binding: BINDING.power,
        isTall: true,
      })
    : latexPart(`\\mathrm{e}^{${input.latex}}`, { binding: BINDING.power });
}

/** `sin θ` and `sin 2θ` need no brackets; a sum, a power, a function or a product of numbers does. */
function mayStandOpen(input: LatexPart): boolean {
  if (input.startsWithSign || input.latex.includes('\\cdot')) return false;
  if (input.kind === 'figure') return true;
  return input.kind === 'letter' && (input.binding === BINDING.atom || input.binding === BINDING.product);
}
