import { findNamedUnit } from '#shared/units/find-named-unit.ts';
import type { ExpressionFault, NamedSymbol } from './expression.ts';
import { findFunction } from './functions.ts';
import { expressionFault, type Token } from './tokens.ts';

/** The tokens of a text, and the text as it is shown: `{id}` replaced by symbols. */
export interface Tokens {
  readonly shown: string;
  readonly tokens: readonly Token[];
  readonly fault: ExpressionFault | null;
}

const RULES: readonly (readonly [Token['kind'] | 'space', RegExp])[] = [
  ['space', /[\s\u00A0\u2009\u202F]+/uy],
  ['id', /\{([A-Za-z0-9-]{1,64})\}/uy],
  ['number', /(?:\d+(?:[\u2009\u202F]\d{3})*(?:\.\d*)?|\.\d+)(?:[eE][+\-−]?\d+)?/uy],
  ['name', /(?:\p{L}+\d+\p{L}*(?=\s*\()|\p{L}+(?:_(?:\{[\p{L}\p{Nd},]+\}|[\p{L}\p{Nd}]+))?|°C?|[%‰√℃])/uy],
  ['raised', /[⁺⁻]?[⁰¹²³⁴⁵⁶⁷⁸⁹]+/uy],
  ['unit', /\[([^[\]]*)\]/uy],
  ['sign', /<=|>=|==|!=|\*\*|&&|\|\||[-+*/^()<>?:,|·⋅∙×÷−–≤≥≠=]/uy],
];

const PLAIN_SIGNS: Readonly<Record<string, string>> = {
  '·': '*',
  '⋅': '*',
  '∙': '*',
  '×': '*',
  '÷': '/',
  '−': '-',
  '–': '-',
  '≤': '<=',
  '≥': '>=',
  '≠': '!=',
  '**': '^',
};

const RAISED = '⁰¹²³⁴⁵⁶⁷⁸⁹';

/**
 * Cuts a text into tokens and writes its shown form. Signs that people paste are made plain here; nothing is
 * decided about meaning.
 *
 * @param text - shown or stored form, or a mix
 * @example tokenise('{q1}²', [{ id: 'q1', symbol: 'C_v' }]).shown // => 'C_v²'
 */
export function tokenise(text: string, symbols: readonly NamedSymbol[]): Tokens {
  const source = text.includes('{') ? withPlainDegrees(text) : text;
  const byId = new Map(symbols.map(({ id, symbol }) => [id, symbol]));
  const tokens: Token[] = [];
  let shown = '';
  let spaced = false;
  for (let at = 0; at < source.length;) {
    const match = matchAt(source, at);
    if (match === null) {
      const rest = shown + source.slice(at);
      return { shown: rest, tokens, fault: foreignSign(source, at, shown.length) };
    }
    at += match.text.length;
    if (match.kind === 'space') {
      shown += match.text;
      spaced = true;
      continue;
    }
    let written = match.text;
    if (match.kind === 'id') {
      const symbol = byId.get(match.inner);
      if (symbol === undefined) return goneSource(shown, source.slice(at), tokens);
      const glue = glueBefore(shown, tokens.at(-1), symbol);
      if (glue === '*') shown = shown.trimEnd();
      shown += glue;
      written = symbol;
    } else if (tokens.at(-1)?.kind === 'id' && !spaced && /^[\p{L}\d]/u.test(written)) shown += ' ';
    const span = { from: shown.length, to: shown.length + written.length };
    shown += written;
    tokens.push({ ...content(match), span, spaced } as Token);
    spaced = false;
  }
  return { shown, tokens, fault: null };
}

interface Match {
  readonly kind: Token['kind'] | 'space';
  readonly text: string;
  readonly inner: string;
}

function matchAt(text: string, at: number): Match | null {
  for (const [kind, rule] of RULES) {
    rule.lastIndex = at;
    const match = rule.exec(text);
    if (match === null) continue;
    const found = match[0];
    // Only functions have figures in their names; x2 is x, then 2.
    if (kind === 'name' && /\d/u.test(found) && !found.includes('_') && findFunction(found) === null) {
      const letters = /^\p{L}+/u.exec(found)?.[0] ?? found;
      return { kind, text: letters, inner: letters };
    }
    return { kind, text: found, inner: match[1] ?? found };
  }
  return null;
}

function content({ kind, text, inner }: Match): object {
  switch (kind) {
    case 'number':
      return { kind, text: text.replace(/[\u2009\u202F]/gu, '').replace('−', '-') };
    case 'id':
      return { kind, id: inner };
    case 'unit':
      return { kind, text: inner };
    case 'raised':
      return { kind, power: raisedPower(text) };
    case 'sign':
      return { kind, text: PLAIN_SIGNS[text] ?? text };
    default:
      return { kind, text };
  }
}

function raisedPower(text: string): number {
  const figures = [...text].map((sign) => (sign === '⁻' ? '-' : sign === '⁺' ? '' : RAISED.indexOf(sign)));
  return Number(figures.join(''));
}

/** A symbol that is also a unit must not come to stand right after a number: a new name may make it one. */
function glueBefore(shown: string, previous: Token | undefined, symbol: string): '' | ' ' | '*' {
  if (previous?.kind === 'number' && findNamedUnit(symbol) !== null) return '*';
  return /[\p{L}\p{Nd}_]$/u.test(shown) && previous?.kind !== 'number' ? ' ' : '';
}

/** `38 [°]` is shown as 38° where nothing behind it could be drawn into the unit. */
function withPlainDegrees(stored: string): string {
  return stored.replace(/ ?\[(°|%)\](?=\s*(?:$|[-+−)<>?:,]))/gu, '$1');
}

function goneSource(shown: string, rest: string, tokens: readonly Token[]): Tokens {
  const span = { from: shown.length, to: shown.length + 1 };
  const sentence = 'A quantity that stood here has been removed. Write another in its place.';
  return { shown: `${shown}?${rest}`, tokens, fault: expressionFault('source gone', sentence, span) };
}

const ADVICE: Readonly<Record<string, string>> = {
  '\\': 'Write formulas as plain text, like sqrt(2*g*h), not in LaTeX.',
  '±': 'A formula takes values without ±; the uncertainty comes with each quantity.',
  '!': 'There is no factorial here. Write out the product.',
  '½': 'Write 1/2 and a star: 1/2*m*v^2.',
  '¼': 'Write 1/4.',
  '∞': 'Nothing infinite can be computed.',
  '"': 'A formula has no quotation marks.',
  "'": 'A symbol has no prime. Use a label instead, such as v_1.',
  '[': 'A square bracket is not closed. It holds a unit, like 2 [cm].',
  ']': 'A square bracket is closed that was not opened.',
  '{': 'Use round brackets.',
  '}': 'Use round brackets.',
  ';': 'Write one formula only.',
};

function foreignSign(source: string, at: number, shownAt: number): ExpressionFault {
  const sign = String.fromCodePoint(source.codePointAt(at) ?? 32);
  const span = { from: shownAt, to: shownAt + sign.length };
  const advice = ADVICE[sign] ?? 'Formulas have letters, numbers, + - * / ^ and round brackets.';
  return expressionFault('syntax', `“${sign}” cannot stand in a formula. ${advice}`, span);
}
