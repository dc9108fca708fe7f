import type { Glyph } from 'fontkit';
import { FONT_STACKS, type FontStack } from './font-stacks.ts';
import { loadFace, type Face } from './load-face.ts';

/** Glyphs of one face on one line. Lengths are in ems of the text's size. */
export interface ShapedRun {
  readonly face: Face;
  readonly glyphs: readonly Glyph[];
  readonly advances: readonly number[];
  readonly x: number;
  /** Size of these glyphs as a share of the text's size; less than 1 for raised and lowered figures. */
  readonly scale: number;
  /** How far the baseline is lifted. */
  readonly rise: number;
}

/** A text without breaks, ready to be drawn at any size. */
export interface ShapedText {
  readonly text: string;
  readonly width: number;
  readonly runs: readonly ShapedRun[];
}

const RAISED: Readonly<Record<string, string>> = {
  '⁰': '0', '¹': '1', '²': '2', '³': '3', '⁴': '4', '⁵': '5', '⁶': '6', '⁷': '7', '⁸': '8', '⁹': '9',
  '⁻': '−', '⁺': '+', 'ⁿ': 'n',
}; // prettier-ignore
const LOWERED: Readonly<Record<string, string>> = {
  '₀': '0', '₁': '1', '₂': '2', '₃': '3', '₄': '4', '₅': '5', '₆': '6', '₇': '7', '₈': '8', '₉': '9',
}; // prettier-ignore

const SCRIPT_SCALE = 0.66;
const RAISE = 0.36;
const LOWER = -0.12;
const SPACE = 0x20;
const CACHE_LIMIT = 50_000;

const cache = new Map<string, ShapedText>();

interface OpenRun {
  readonly face: Face;
  readonly scale: number;
  readonly rise: number;
  text: string;
}

/**
 * Shapes a text in a font stack: each character in the first face that has it, raised and lowered figures made from
 * ordinary ones so that all of them have one look. Results are kept.
 */
export function shapeText(stack: FontStack, text: string): ShapedText {
  const key = `${stack}\0${text}`;
  const known = cache.get(key);
  if (known) return known;
  let width = 0;
  const runs = splitByFace(stack, text).map((open) => {
    const run = shapeRun(open, width);
    width += run.advances.reduce((sum, advance) => sum + advance, 0);
    return run;
  });
  const shaped = { text, width, runs };
  if (cache.size > CACHE_LIMIT) cache.clear();
  cache.set(key, shaped);
  return shaped;
}

function splitByFace(stack: FontStack, text: string): OpenRun[] {
  const runs: OpenRun[] = [];
  for (const character of text) {
    const { drawn, scale, rise } = setting(character);
    const last = runs.at(-1);
    const face = faceFor(stack, drawn, last);
    if (last && last.face === face && last.scale === scale && last.rise === rise) last.text += drawn;
    else runs.push({ face, scale, rise, text: drawn });
  }
  return runs;
}

function setting(character: string): { drawn: string; scale: number; rise: number } {
  const raised = RAISED[character];
  if (raised !== undefined) return { drawn: raised, scale: SCRIPT_SCALE, rise: RAISE };
  const lowered = LOWERED[character];
  if (lowered !== undefined) return { drawn: lowered, scale: SCRIPT_SCALE, rise: LOWER };
  return { drawn: character, scale: 1, rise: 0 };
}

function faceFor(stack: FontStack, character: string, open: OpenRun | undefined): Face {
  const codePoint = character.codePointAt(0) ?? SPACE;
  if (codePoint === SPACE && open) return open.face;
  const names = FONT_STACKS[stack];
  for (const name of names) {
    const face = loadFace(name);
    if (face.has(codePoint)) return face;
  }
  return loadFace(names[0]);
}

function shapeRun(open: OpenRun, x: number): ShapedRun {
  const { face, scale, rise, text } = open;
  const { glyphs, positions } = face.font.layout(text);
  const unit = scale / face.font.unitsPerEm;
  return { face, glyphs, advances: positions.map((p) => p.xAdvance * unit), x, scale, rise };
}

/** Heights of a stack's first face above and below the baseline, in ems. */
export function stackHeights(stack: FontStack): { ascent: number; descent: number; capHeight: number } {
  const { font } = loadFace(FONT_STACKS[stack][0]);
  const unit = 1 / font.unitsPerEm;
  return {
    ascent: font.ascent * unit,
    descent: -font.descent * unit,
    capHeight: font.capHeight * unit,
  };
}
