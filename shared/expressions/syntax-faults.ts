import type { ExpressionFault, Span } from './expression.ts';
import { expressionFault, type Token } from './tokens.ts';

const SIGN_ADVICE: Readonly<Record<string, string>> = {
  '=': 'Write the right side only, or == to compare.',
  '||': 'Use a choice instead: a > 1 ? b : c.',
  '&&': 'Chain comparisons instead: 1 < a < 2.',
};

/**
 * An operator where a value must come first, or one that formulas do not have.
 *
 * @example misplacedSign('=', { from: 1, to: 2 }).sentence // => '“=” cannot stand here. Write the right side only, or == to compare.'
 */
export function misplacedSign(sign: string, span: Span): ExpressionFault {
  const advice = SIGN_ADVICE[sign];
  const sentence =
    advice === undefined ? `${sign} has no value before it.` : `“${sign}” cannot stand here. ${advice}`;
  return expressionFault('syntax', sentence, span, sign === '=' ? ['=='] : []);
}

/** Deepest nesting of brackets. */
export const MAX_BRACKET_DEPTH = 40;

/** More brackets inside one another than anybody can follow. */
export function tooDeep(at: number): ExpressionFault {
  const sentence = `More than ${MAX_BRACKET_DEPTH} brackets stand inside one another. Split the formula.`;
  return expressionFault('syntax', sentence, { from: at, to: at + 1 });
}

/** `x^y²`: is y squared, or the whole? */
export function powerOfPower(span: Span): ExpressionFault {
  return expressionFault('ambiguous text', 'A power of a power can be read in two ways. Use brackets.', span);
}

/** A comma outside a list of inputs: most often a decimal comma. */
export function misplacedComma(tokens: readonly Token[], at: number, shown: string): ExpressionFault {
  const before = tokens[at - 1];
  const comma = tokens[at];
  const after = tokens[at + 1];
  const span = comma?.span ?? { from: 0, to: shown.length };
  if (before?.kind === 'number' && after?.kind === 'number' && !after.spaced && comma?.spaced === false) {
    const whole = { from: before.span.from, to: after.span.to };
    const typed = shown.slice(whole.from, whole.to);
    const hasBoth = before.text.includes('.') || after.text.includes('.');
    const mend = hasBoth ? before.text.replace('.', '') + after.text : `${before.text}.${after.text}`;
    const why = hasBoth ? 'has both decimal marks' : 'has a comma; the decimal mark in a formula is a point';
    return expressionFault('syntax', `${typed} ${why}. Write ${mend}.`, whole, [mend]);
  }
  return expressionFault(
    'syntax',
    'A comma only stands between the inputs of min, max, hypot or atan2.',
    span,
  );
}

/** `sin x`, `sin⁻¹(x)`, a function without anything. */
export function functionWithoutBracket(
  tokens: readonly Token[],
  at: number,
  open: number,
  power: number,
  shown: string,
): ExpressionFault {
  const name = tokens[at];
  const span = name?.span ?? { from: 0, to: shown.length };
  const written = shown.slice(span.from, span.to);
  if (power < 1) {
    const whole = { from: span.from, to: tokens[open - 1]?.span.to ?? span.to };
    const sentence = `“${shown.slice(whole.from, whole.to)}” can be read in two ways. Write a${written}(…) for the inverse function or 1/${written}(…).`;
    return expressionFault('ambiguous text', sentence, whole);
  }
  const first = tokens[open];
  if (first === undefined || (first.kind === 'sign' && first.text !== '|')) {
    return expressionFault('syntax', `${written} needs brackets: ${written}(…).`, span);
  }
  const second = tokens[open + 1];
  const last = first.kind === 'number' && second?.kind === 'name' ? second : first;
  const input = shown.slice(first.span.from, last.span.to);
  const raised = power === 1 ? '' : `^${power}`;
  const mend = `${written}${raised}(${input})`;
  const whole = { from: span.from, to: last.span.to };
  return expressionFault(
    'ambiguous text',
    `${written} needs brackets, to show what it is of. Write ${mend}.`,
    whole,
    [mend],
  );
}

/** Too few or too many inputs of a function; null when their number is right. */
export function wrongCount(
  name: string,
  [fewest, most]: readonly [number, number],
  count: number,
  span: Span,
): ExpressionFault | null {
  if (count >= fewest && count <= most) return null;
  const wanted = fewest === most ? (most === 1 ? 'one input' : 'two inputs') : `two to ${most} inputs`;
  return expressionFault('syntax', `${name} takes ${wanted}, not ${count}.`, span);
}

/** A number with a unit behind `/` or `^`: does the unit belong to the number or to the whole? */
export function unitBehind(
  node: { readonly span: Span },
  stored: string,
  isDivisor: boolean,
  shown: string,
): ExpressionFault {
  const sign = isDivisor ? '/' : '^';
  const typed = shown.slice(node.span.from, node.span.to);
  const sentence = `“${sign}${typed}” can be read in two ways. Write ${sign}(${stored}), or put the unit behind a bracket round the whole.`;
  return expressionFault('ambiguous text', sentence, node.span, [`(${stored})`]);
}

/** Place behind the bracket that closes the one at a token; null when none does. */
export function closingPlace(tokens: readonly Token[], at: number): number | null {
  let depth = 0;
  for (const token of tokens.slice(at)) {
    if (token.kind !== 'sign') continue;
    depth += token.text === '(' ? 1 : token.text === ')' ? -1 : 0;
    if (depth === 0) return token.span.to;
  }
  return null;
}

/** What is missing where the text ends; null when nothing is. */
export function unfinished(
  tokens: readonly Token[],
  shown: string,
  open: { readonly kind: string; readonly at: number } | null,
  endsInOperand: boolean,
): ExpressionFault | null {
  const end = shown.length;
  const last = tokens.at(-1);
  if (last === undefined) {
    return expressionFault('syntax', 'Write a formula, such as 2*sqrt(h*y).', { from: 0, to: end });
  }
  if (open !== null) {
    const sentence = open.kind === 'bar' ? 'A bar | is not closed.' : 'A bracket is not closed.';
    return expressionFault('syntax', sentence, { from: open.at, to: end });
  }
  if (endsInOperand) return null;
  const written = shown.slice(last.span.from, last.span.to);
  return expressionFault('syntax', `Something is missing after “${written}”.`, last.span);
}
