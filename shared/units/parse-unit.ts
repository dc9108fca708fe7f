import { addRational, rational, RATIONAL_ONE, type Rational } from '#shared/numeric/rational.ts';
import { buildUnit } from './build-unit.ts';
import { findNamedUnit } from './find-named-unit.ts';
import { normaliseUnitText } from './normalise-unit-text.ts';
import { suggestUnits } from './suggest-unit.ts';
import type { UnitFactor, UnitResult } from './unit.ts';

type Refusal = Extract<UnitResult, { ok: false }>;

const TOKEN = /\s*(?:([\p{L}°%‰]+)|(-?\d+(?:[.,]\d+)?)|([·/^()]))|( +)/uy;

interface Token {
  readonly kind: 'name' | 'number' | 'sign';
  readonly text: string;
  readonly afterSpace: boolean;
}

const MAX_UNIT_LENGTH = 60;
const cache = new Map<string, UnitResult>();

/**
 * Reads a unit: signs with SI prefixes, powers, products by space or dot, one division or a bracket after it.
 * Nothing is guessed: what can be read in two ways is refused, with both readings offered.
 *
 * @param text - `cm`, `m/s^2`, `m·s⁻²`, `J/(kg K)`, `°`, `%`, `1`; nothing at all is a pure number too
 * @example parseUnit('µm/s²').ok // => true
 * @example parseUnit('sec') // => { ok: false, code: 'unknown unit', sentence: 'There is no unit “sec”. Did you mean s?', suggestions: ['s'] }
 */
export function parseUnit(text: string): UnitResult {
  const known = cache.get(text);
  if (known !== undefined) return known;
  const result =
    text.length > MAX_UNIT_LENGTH
      ? refuse('syntax', `“${text.slice(0, 20)}…” is too long for a unit.`)
      : read(text);
  // Texts come from people: keep the memory bounded.
  if (cache.size < 2000) cache.set(text, result);
  return result;
}

function read(text: string): UnitResult {
  const tokens = tokenise(normaliseUnitText(text));
  if ('ok' in tokens) return tokens;
  if (tokens.length === 0) return { ok: true, unit: buildUnit([]) };
  if (tokens.length > 1 && tokens.some(hasOwnZero)) {
    const mended = text.replace(/°C|℃|degC/gu, 'K');
    const sentence = `°C has its own zero and cannot be part of “${text}”. Write ${mended}.`;
    return refuse('ambiguous text', sentence, [mended]);
  }
  const reader = new UnitReader(text, tokens);
  const factors = reader.product(0);
  if (reader.refusal !== null) return reader.refusal;
  const unit = buildUnit(factors);
  if (unit === null)
    return refuse('syntax', `“${text}” takes a root of a unit that has none. Use whole powers.`);
  return { ok: true, unit };
}

function hasOwnZero(token: Token): boolean {
  return token.kind === 'name' && findNamedUnit(token.text)?.unit.offset !== undefined;
}

function tokenise(text: string): readonly Token[] | Refusal {
  const tokens: Token[] = [];
  let at = 0;
  let afterSpace = false;
  while (at < text.length) {
    TOKEN.lastIndex = at;
    const match = TOKEN.exec(text);
    if (match === null) {
      const sign = String.fromCodePoint(text.codePointAt(at) ?? 32);
      return refuse('syntax', `“${sign}” cannot stand in a unit. Write units like cm, m/s^2 or J/(kg K).`);
    }
    const [whole, name, number, sign] = match;
    const kind = name !== undefined ? 'name' : number !== undefined ? 'number' : 'sign';
    const found = name ?? number ?? sign;
    if (found !== undefined)
      tokens.push({ kind, text: found, afterSpace: afterSpace || whole.startsWith(' ') });
    afterSpace = found === undefined;
    at = TOKEN.lastIndex;
  }
  return tokens;
}

/** Recursive descent over the tokens; the first refusal stops everything. */
class UnitReader {
  refusal: Refusal | null = null;
  private next = 0;

  constructor(
    private readonly text: string,
    private readonly tokens: readonly Token[],
  ) {}

  /** product := group { (space | · | /) group } */
  product(depth: number): UnitFactor[] {
    const factors = this.group(depth);
    let divided = false;
    while (this.refusal === null && this.next < this.tokens.length && this.peek() !== ')') {
      const divides = this.peek() === '/';
      if (divides || this.peek() === '·') this.next += 1;
      if (!divides && divided) return this.fail(this.afterDivision());
      const group = this.group(depth);
      factors.push(...(divides ? group.map(inverse) : group));
      divided ||= divides;
    }
    return depth === 0 && this.peek() === ')'
      ? this.fail(this.syntax('a bracket is closed that was not opened'))
      : factors;
  }

  private group(depth: number): UnitFactor[] {
    const token = this.tokens[this.next];
    if (token === undefined) return this.fail(this.syntax('something is missing at its end'));
    this.next += 1;
    if (token.text === '(' && depth < 8) {
      const inner = this.product(depth + 1);
      if (this.refusal !== null) return [];
      if (this.peek() !== ')') return this.fail(this.syntax('a bracket is not closed'));
      this.next += 1;
      return this.raised(inner);
    }
    if (token.kind === 'name') return this.named(token.text);
    if (token.text === '1') return [];
    if (token.kind === 'number') return this.fail(this.figure(token.text));
    return this.fail(this.syntax(`“${token.text}” has nothing before it`));
  }

  private named(name: string): UnitFactor[] {
    const after = this.tokens[this.next];
    if (after?.kind === 'number' && !after.afterSpace) {
      this.next += 1;
      const power = `${name}^${after.text}`;
      return this.fail(
        refuse('syntax', `“${name}${after.text}” is not a unit. Did you mean ${power}?`, [
          this.text.replace(`${name}${after.text}`, power),
        ]),
      );
    }
    const found = findNamedUnit(name);
    if (found === null) return this.fail(unknown(name, this.text));
    const factor = { prefix: found.prefix?.sign ?? '', name: found.unit.names[0], power: RATIONAL_ONE };
    return this.raised([factor]);
  }

  private raised(factors: UnitFactor[]): UnitFactor[] {
    if (this.peek() !== '^') return factors;
    this.next += 1;
    const exponent = this.exponent();
    if (exponent === null) return this.fail(this.syntax('a power must be a number such as 2, -1 or (1/2)'));
    return factors.map((factor) => ({
      ...factor,
      power: rational(factor.power.n * exponent.n, factor.power.d * exponent.d),
    }));
  }

  private exponent(): Rational | null {
    const number = this.tokens[this.next];
    if (number?.kind === 'number') {
      this.next += 1;
      return smallFraction(number.text);
    }
    const [open, top, slash, bottom, close] = this.tokens
      .slice(this.next, this.next + 5)
      .map((token) => token.text);
    if (open !== '(' || top === undefined) return null;
    const whole = slash === ')';
    if (!whole && (slash !== '/' || close !== ')')) return null;
    this.next += whole ? 3 : 5;
    const upper = smallFraction(top);
    const lower = whole ? RATIONAL_ONE : smallFraction(bottom ?? '');
    return upper === null || lower === null || lower.n === 0n
      ? null
      : rational(upper.n * lower.d, upper.d * lower.n);
  }

  private peek(): string | undefined {
    return this.tokens[this.next]?.text;
  }

  private fail(refusal: Refusal): UnitFactor[] {
    this.refusal ??= refusal;
    return [];
  }

  private syntax(what: string): Refusal {
    return refuse('syntax', `“${this.text}” is not a unit: ${what}.`);
  }

  private figure(number: string): Refusal {
    return refuse(
      'syntax',
      `“${this.text}” has a figure in it. Put ${number} with the number, and write the unit alone.`,
    );
  }

  private afterDivision(): Refusal {
    const parts = normaliseUnitText(this.text).split('/');
    const [top = '', bottom = ''] = parts;
    const [first = '', ...rest] = bottom.split(/[ ·]/u);
    const inside = `${top}/(${bottom.replaceAll('·', ' ')})`;
    const outside = `${[top, ...rest].join(' ').replaceAll('·', ' ')}/${first}`;
    const readings = parts.length === 2 && !this.text.includes('(') ? [inside, outside] : [];
    const offer =
      readings.length === 2 ? ` Write ${inside} or ${outside}.` : ' Put what is divided by in brackets.';
    return refuse('ambiguous text', `“${this.text}” can be read in two ways.${offer}`, readings);
  }
}

function unknown(name: string, text: string): Refusal {
  if (name === 'dB' || name === 'pH' || name === 'Np') {
    return refuse(
      'unknown unit',
      `${name} is the logarithm of a ratio. Enter the ratio itself, with unit 1.`,
    );
  }
  const near = suggestUnits(name);
  const mend =
    near.length === 0
      ? 'Write units like cm, m/s^2 or °, and 1 for a pure number.'
      : `Did you mean ${near.join(' or ')}?`;
  return refuse(
    'unknown unit',
    `There is no unit “${name}”. ${mend}`,
    near.map((sign) => text.replace(name, sign)),
  );
}

function refuse(code: Refusal['code'], sentence: string, suggestions: readonly string[] = []): Refusal {
  return { ok: false, code, sentence, suggestions };
}

function inverse(factor: UnitFactor): UnitFactor {
  return { ...factor, power: { n: -factor.power.n, d: factor.power.d } };
}

/** A power of at most two figures and two decimals; larger ones are slips. */
function smallFraction(text: string): Rational | null {
  const match = /^(-?)(\d{1,2})(?:[.,](\d{1,2}))?$/u.exec(text);
  if (match === null) return null;
  const [, sign = '', whole = '', part = ''] = match;
  const scale = 10n ** BigInt(part.length);
  const magnitude = addRational(rational(BigInt(whole)), rational(BigInt(part || '0'), scale));
  return sign === '-' ? { n: -magnitude.n, d: magnitude.d } : magnitude;
}
