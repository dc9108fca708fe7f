/** Numbers and colours as PDF operators take them. */

/** A length: two decimals, no trailing noughts, never −0. */
export function length(value: number): string {
  const rounded = Math.round(value * 100) / 100;
  return String(rounded === 0 ? 0 : rounded);
}

/** A number that other numbers are multiplied by: six decimals. */
export function factor(value: number): string {
  const rounded = Math.round(value * 1e6) / 1e6;
  return String(rounded === 0 ? 0 : rounded);
}

/** A colour with its opacity; every part from 0 to 1. */
export interface Colour {
  readonly red: number;
  readonly green: number;
  readonly blue: number;
  readonly alpha: number;
}

const BLACK: Colour = { red: 0, green: 0, blue: 0, alpha: 1 };
const CLEAR: Colour = { red: 0, green: 0, blue: 0, alpha: 0 };

const parsed = new Map<string, Colour>();

/** Reads `#rgb`, `#rrggbb`, `#rrggbbaa`, `rgb(…)`, `rgba(…)` and `transparent`; anything else is black, as in a browser. */
export function parseColour(text: string): Colour {
  const known = parsed.get(text);
  if (known) return known;
  const colour = readColour(text.trim().toLowerCase());
  parsed.set(text, colour);
  return colour;
}

function readColour(text: string): Colour {
  if (text === 'transparent') return CLEAR;
  if (/^#[0-9a-f]{3}$/u.test(text)) {
    return readColour(`#${[...text.slice(1)].map((digit) => digit + digit).join('')}`);
  }
  if (/^#[0-9a-f]{6}([0-9a-f]{2})?$/u.test(text)) {
    const part = (from: number) => Number.parseInt(text.slice(from, from + 2), 16) / 255;
    return { red: part(1), green: part(3), blue: part(5), alpha: text.length === 9 ? part(7) : 1 };
  }
  const parts =
    /^rgba?\(([^)]*)\)$/u
      .exec(text)?.[1]
      ?.split(/[\s,/]+/u)
      .map(Number) ?? [];
  const [red, green, blue, alpha = 1] = parts;
  if (red === undefined || green === undefined || blue === undefined || parts.some(Number.isNaN))
    return BLACK;
  return { red: red / 255, green: green / 255, blue: blue / 255, alpha };
}

function component(value: number): string {
  return String(Math.round(value * 1000) / 1000);
}

/** The operands of `rg` and `RG`. */
export function colourOperands({ red, green, blue }: Colour): string {
  return `${component(red)} ${component(green)} ${component(blue)}`;
}

/** Sets the colour of fills and of text. */
export function fillColour(colour: string): string {
  return `${colourOperands(parseColour(colour))} rg`;
}

/** Sets the colour of strokes. */
export function strokeColour(colour: string): string {
  return `${colourOperands(parseColour(colour))} RG`;
}
