/**
 * How tightly a piece of a formula holds together, loosest first. Where something tighter is needed, brackets are
 * set round it.
 */
export const BINDING = { choice: 0, comparison: 1, sum: 2, product: 3, power: 4, atom: 5 } as const;
/** One of them. */
export type Binding = (typeof BINDING)[keyof typeof BINDING];

/** A piece of LaTeX and what must be known of it to set it beside another. */
export interface LatexPart {
  readonly latex: string;
  readonly binding: Binding;
  /** Begins with a figure, so that another figure before it needs a dot between. */
  readonly startsWithFigure: boolean;
  /** Begins with a minus. */
  readonly startsWithSign: boolean;
  /** Ends in a figure, or in a unit that must not run into a following letter. */
  readonly ends: 'letter' | 'figure' | 'unit' | 'open function';
  /** What it is, for what may follow an open function and what one may be of. */
  readonly kind: 'figure' | 'letter' | 'function' | 'root' | 'fraction' | 'bracket' | 'other';
  /** Higher than a line: brackets round it must grow. */
  readonly isTall: boolean;
}

/** A part with the usual properties of a letter; `changes` says what differs. */
export function latexPart(latex: string, changes: Partial<LatexPart> = {}): LatexPart {
  return {
    latex,
    binding: BINDING.atom,
    startsWithFigure: false,
    startsWithSign: false,
    ends: 'letter',
    kind: 'letter',
    isTall: false,
    ...changes,
  };
}

/** Brackets round a part, growing only where they must. */
export function inBrackets(part: LatexPart): LatexPart {
  const latex = part.isTall ? `\\left(${part.latex}\\right)` : `(${part.latex})`;
  return latexPart(latex, { kind: 'bracket', isTall: part.isTall });
}

/** The part itself when it holds at least so tightly, else in brackets. */
export function atLeast(part: LatexPart, binding: Binding): LatexPart {
  return part.binding >= binding ? part : inBrackets(part);
}

/**
 * A symbol's or put-in number's LaTeX as a part: what its first and last signs are is read off, class marks aside.
 *
 * @example givenPart('\\htmlClass{fm}{20.0\\,\\mathrm{cm}}').ends // => 'unit'
 * @example givenPart('C_{\\mathrm v}').kind // => 'letter'
 */
export function givenPart(latex: string): LatexPart {
  const bare = /^\\htmlClass\{[^{}]*\}\{([\s\S]*)\}$/u.exec(latex)?.[1] ?? latex;
  const unsigned = bare.replace(/^(?:\{-\}|-|−)/u, '');
  if (!/^[\d.(]/u.test(unsigned)) return latexPart(latex);
  const isPlain = /^[\d.\\,]+$/u.test(unsigned.replace(/\\,/gu, ''));
  const hasSum = /\\pm|\\times/u.test(unsigned) && !unsigned.startsWith('(');
  return latexPart(latex, {
    startsWithFigure: true,
    startsWithSign: unsigned !== bare,
    ends: isPlain ? 'figure' : 'unit',
    kind: 'figure',
    binding: unsigned !== bare || hasSum ? BINDING.sum : isPlain ? BINDING.atom : BINDING.product,
  });
}
