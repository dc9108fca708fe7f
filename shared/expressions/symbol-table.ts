import { findGreekLetter } from '#shared/formatting/greek-letters.ts';
import { splitSymbol, symbolToText } from '#shared/formatting/symbol.ts';
import { findNamedUnit } from '#shared/units/find-named-unit.ts';
import { suggestUnits } from '#shared/units/suggest-unit.ts';
import type { ExpressionFault, NamedSymbol } from './expression.ts';
import { FUNCTION_NAMES } from './functions.ts';
import { expressionFault, type Token } from './tokens.ts';

/** Ids by symbol, whichever way a symbol is spelled. */
export class SymbolTable {
  private readonly ids: ReadonlyMap<string, string>;
  private readonly known: ReadonlySet<string>;
  readonly symbols: readonly string[];

  constructor(symbols: readonly NamedSymbol[]) {
    this.ids = new Map(symbols.map(({ id, symbol }) => [symbolToText(symbol), id]));
    this.known = new Set(symbols.map(({ id }) => id));
    this.symbols = symbols.map(({ symbol }) => symbol);
  }

  /** Id of the quantity that a text names, or null. */
  find(text: string): string | null {
    return this.ids.get(symbolToText(text)) ?? null;
  }

  has(id: string): boolean {
    return this.known.has(id);
  }

  /** `mgh` as `m*g*h`, when each piece is another symbol (or π); null when it cannot be taken apart. */
  split(text: string): readonly string[] | null {
    const [letters = '', sub = ''] = text.split(/(?=_)/u);
    const pieces = [...letters].map((letter, i, all) => (i === all.length - 1 ? letter + sub : letter));
    const areSymbols = pieces.every((piece) => piece === 'π' || this.find(piece) !== null);
    return pieces.length > 1 && new Set(pieces).size === pieces.length && areSymbols ? pieces : null;
  }
}

/**
 * The fault of a name that stands for nothing here.
 *
 * @param next - token behind it: a round bracket means that it was called
 * @example unknownNameFault({ kind: 'name', text: 'q', span: { from: 0, to: 1 }, spaced: false }, undefined, new SymbolTable([]), false).code // => 'unknown symbol'
 */
export function unknownNameFault(
  token: Extract<Token, { kind: 'name' }>,
  next: Token | undefined,
  table: SymbolTable,
  isAfterNumber: boolean,
): ExpressionFault {
  const isCalled = next?.kind === 'sign' && next.text === '(';
  const { code, sentence, suggestions } = unknownName(token.text, isCalled, table, isAfterNumber);
  return expressionFault(code ?? 'unknown symbol', sentence, token.span, suggestions);
}

const WORDS: Readonly<Record<string, string>> = {
  and: 'Chain comparisons instead: 300 < R < 2000.',
  or: 'Use a choice instead: a > 1 ? b : c.',
  not: 'Turn the comparison round instead.',
  mod: 'There is no remainder here.',
  e: 'For the base of the natural logarithm write exp(1), and exp(x) for its power.',
  inf: 'Nothing infinite can be computed.',
  nan: 'It must be a number.',
};

/**
 * What to say of a name that is neither a symbol nor anything else, and what may be meant by it.
 *
 * @param isCalled - a round bracket follows
 * @example unknownName('thta', false, new SymbolTable([{ id: 'q1', symbol: 'θ' }])).suggestions // => ['θ']
 */
export function unknownName(
  name: string,
  isCalled: boolean,
  table: SymbolTable,
  isAfterNumber = false,
): { readonly code?: 'unknown unit'; readonly sentence: string; readonly suggestions: readonly string[] } {
  if (isCalled && name.length > 1) {
    const near = FUNCTION_NAMES.filter((known) => isNear(known, name)).slice(0, 2);
    return {
      sentence: `There is no function “${name}”. ${asked(near, 'Write sqrt, exp, log, sin, cos, tan, abs, min or max.')}`,
      suggestions: near,
    };
  }
  const word = WORDS[name.toLowerCase()];
  if (word !== undefined)
    return { sentence: `“${name}” is no quantity of this problem. ${word}`, suggestions: [] };
  const split = table.split(name);
  if (split !== null) {
    const product = split.join('*');
    return {
      sentence: `“${name}” is no quantity of this problem. Did you mean ${product}?`,
      suggestions: [product],
    };
  }
  const units = isAfterNumber ? suggestUnits(name) : [];
  if (units.length > 0) {
    const sentence = `“${name}” is neither a unit nor a quantity here. ${asked(units, '')}`;
    return { code: 'unknown unit', sentence, suggestions: units.map((unit) => `[${unit}]`) };
  }
  if (findNamedUnit(name) !== null) {
    const sentence = `“${name}” is a unit here, not a quantity. Write it after a number, like 1 [${name}].`;
    return { sentence, suggestions: [`1 [${name}]`] };
  }
  const near = table.symbols.filter((symbol) => isNearSymbol(symbol, name)).slice(0, 3);
  return {
    sentence: `“${name}” is no quantity of this problem. ${asked(near, 'Add it to the register, or write another.')}`,
    suggestions: near,
  };
}

function asked(near: readonly string[], otherwise: string): string {
  return near.length === 0 ? otherwise : `Did you mean ${near.join(' or ')}?`;
}

/** The same letter in another case or with another label, or nearly the same spelling. */
function isNearSymbol(symbol: string, name: string): boolean {
  const own = splitSymbol(symbol);
  const other = splitSymbol(name);
  if (own !== null && other !== null) {
    if (symbolToText(symbol).toLowerCase() === symbolToText(name).toLowerCase()) return true;
    if (own.letter === other.letter)
      return own.sub === null || other.sub === null || isNear(own.sub, other.sub);
    return false;
  }
  if (own === null) return isNear(symbol, name);
  // `Cv` for C_v, `thta` for θ.
  const joined = own.letter + (own.sub ?? '');
  return joined.toLowerCase() === name.toLowerCase() || nearGreek(symbol, name);
}

function nearGreek(symbol: string, name: string): boolean {
  const letter = symbolToText(symbol);
  return name.length > 2 && isNear(findGreekLetter(letter)?.name ?? '', name);
}

/** At most one letter added, dropped or changed. */
function isNear(known: string, typed: string): boolean {
  const a = known.toLowerCase();
  const b = typed.toLowerCase();
  if (Math.abs(a.length - b.length) > 1) return false;
  let start = 0;
  while (start < Math.min(a.length, b.length) && a[start] === b[start]) start += 1;
  let end = 0;
  while (end < Math.min(a.length, b.length) - start && a.at(-1 - end) === b.at(-1 - end)) end += 1;
  return a.length - start - end <= 1 && b.length - start - end <= 1;
}
