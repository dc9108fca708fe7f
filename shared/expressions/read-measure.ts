import { decimalToRational, rationalToNumber } from '#shared/numeric/rational.ts';
import { decimalToNumber, parseDecimal } from '#shared/numeric/decimal.ts';
import { findNamedUnit } from '#shared/units/find-named-unit.ts';
import { parseUnit } from '#shared/units/parse-unit.ts';
import { readSi } from '#shared/units/reading.ts';
import type { ExpressionFault, ExpressionNode, Span } from './expression.ts';
import { findFunction } from './functions.ts';
import type { SymbolTable } from './symbol-table.ts';
import { expressionFault, type Token } from './tokens.ts';

/** A number, with the unit behind it when there is one, and the number of tokens that took. */
export type Measured =
  | { readonly ok: true; readonly node: ExpressionNode; readonly used: number; readonly stored: string }
  | { readonly ok: false; readonly fault: ExpressionFault };

/** Beyond these, a number is a slip. */
const MAX_EXPONENT = 300;

/**
 * Reads a number and decides whether what follows is its unit. A bracket always is. A name is, when it is a unit
 * and no symbol; when it is both, both readings are offered.
 */
export function readMeasure(
  tokens: readonly Token[],
  at: number,
  shown: string,
  table: SymbolTable,
): Measured {
  const number = tokens[at];
  if (number?.kind !== 'number') throw new TypeError('readMeasure: needs a number first');
  const next = tokens[at + 1];
  if (next?.kind === 'unit') return withUnit(number, next.text, next.span, 2, tokens.slice(at + 2, at + 4));
  if (next?.kind !== 'name' || isCall(tokens, at + 1)) return plainNumber(number);
  const isUnit = findNamedUnit(next.text) !== null;
  if (!isUnit) return plainNumber(number);
  const split = table.split(next.text);
  if (table.find(next.text) !== null || split !== null) {
    const product = `${number.text}*${(split ?? [next.text]).join('*')}`;
    return twoReadings(shown, number.span, next.span, product, `${number.text} [${next.text}]`);
  }
  return bareUnit(tokens, at, shown, table);
}

/** A unit in brackets behind a round bracket: `(1/2) [m]` is half of 1 m. */
export function readUnitAlone(token: Extract<Token, { kind: 'unit' }>, after: readonly Token[]): Measured {
  const one: Token = { kind: 'number', text: '1', span: token.span, spaced: false };
  return withUnit(one, token.text, token.span, 1, after);
}

/** A run like `m/s^2`: goes on while what follows can only be a unit. */
function bareUnit(tokens: readonly Token[], at: number, shown: string, table: SymbolTable): Measured {
  const number = tokens[at] as Extract<Token, { kind: 'number' }>;
  let end = afterPower(tokens, at + 2);
  for (;;) {
    const operator = tokens[end];
    const joined = operator?.kind === 'sign' && (operator.text === '*' || operator.text === '/');
    const name = tokens[joined ? end + 1 : end];
    if (name?.kind !== 'name' || isCall(tokens, joined ? end + 1 : end)) break;
    if (findNamedUnit(name.text) === null) break;
    if (table.find(name.text) !== null) {
      const whole = { from: number.span.from, to: name.span.to };
      const first = shown.slice(number.span.to, tokens[end - 1]?.span.to).trim();
      const all = shown.slice(number.span.to, name.span.to).trim();
      const rest = joined ? operator.text : '*';
      return twoReadings(
        shown,
        whole,
        whole,
        `${number.text} [${all}]`,
        `${number.text} [${first}]${rest}${name.text}`,
      );
    }
    end = afterPower(tokens, (joined ? end + 1 : end) + 1);
  }
  const last = tokens[end - 1]?.span.to ?? number.span.to;
  const span = { from: tokens[at + 1]?.span.from ?? number.span.to, to: last };
  return withUnit(number, shown.slice(span.from, span.to), span, end - at, tokens.slice(end, end + 2));
}

/** Index behind a whole power, if one stands at `at`. */
function afterPower(tokens: readonly Token[], at: number): number {
  const here = tokens[at];
  if (here?.kind === 'raised') return at + 1;
  if (here?.kind !== 'sign' || here.text !== '^') return at;
  const minus = tokens[at + 1];
  const number = minus?.kind === 'sign' && minus.text === '-' ? at + 2 : at + 1;
  const power = tokens[number];
  return power?.kind === 'number' && /^\d{1,2}$/u.test(power.text) ? number + 1 : at;
}

function withUnit(
  number: Extract<Token, { kind: 'number' }>,
  unitText: string,
  unitSpan: Span,
  used: number,
  [after, power]: readonly Token[],
): Measured {
  const span = { from: number.span.from, to: unitSpan.to };
  const unit = parseUnit(unitText.trim());
  if (!unit.ok) return refused(unit.code, unit.sentence, unitSpan, unit.suggestions);
  const stored = `${number.text} [${unit.unit.text}]`;
  if (after?.kind === 'raised' || (after?.kind === 'sign' && after.text === '^')) {
    const exponent =
      after.kind === 'raised' ? String(after.power) : power?.kind === 'number' ? power.text : 'n';
    const mends = [`(${stored})^${exponent}`, `${number.text} [${unit.unit.text}^${exponent}]`];
    const sentence = `The power of ${stored} can be read in two ways. Write ${mends.join(' or ')}.`;
    return refused('ambiguous text', sentence, { from: span.from, to: after.span.to });
  }
  const reading = readSi({ text: number.text, unit: unit.unit.text });
  if (!reading.ok) return refused('syntax', reading.sentence, number.span);
  const { dimension, value } = reading;
  const affine = unit.unit.offset !== undefined;
  return {
    ok: true,
    node: { kind: 'measure', text: number.text, unit: unit.unit.text, value, dimension, affine, span },
    used,
    stored,
  };
}

function plainNumber(number: Extract<Token, { kind: 'number' }>): Measured {
  const decimal = parseDecimal(number.text);
  if (
    decimal === null ||
    Math.abs(decimal.scale) > MAX_EXPONENT ||
    !Number.isFinite(decimalToNumber(decimal))
  ) {
    return refused('syntax', `${number.text} is out of the range of numbers.`, number.span);
  }
  const exact = decimalToRational(decimal);
  const value = rationalToNumber(exact);
  return {
    ok: true,
    node: { kind: 'number', text: number.text, value, exact, span: number.span },
    used: 1,
    stored: number.text,
  };
}

function twoReadings(shown: string, from: Span, to: Span, first: string, second: string): Measured {
  const span = { from: from.from, to: to.to };
  const typed = shown.slice(span.from, span.to);
  return refused('ambiguous text', `“${typed}” can be read in two ways. Write ${first} or ${second}.`, span, [
    first,
    second,
  ]);
}

function refused(
  code: ExpressionFault['code'],
  sentence: string,
  span: Span,
  suggestions: readonly string[] = [],
): Measured {
  return { ok: false, fault: expressionFault(code, sentence, span, suggestions) };
}

function isCall(tokens: readonly Token[], at: number): boolean {
  const name = tokens[at];
  const open = tokens[at + 1];
  return (
    name?.kind === 'name' && findFunction(name.text) !== null && open?.kind === 'sign' && open.text === '('
  );
}
