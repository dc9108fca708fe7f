import type { FontName } from '../fonts/font-files.ts';
import { loadFace, type Face } from '../fonts/load-face.ts';

/** A family of faces. `Report` is STIX Two Text, in which the screen draws KaTeX's text faces as well. */
export type Family =
  | 'Report' | 'Main' | 'Math' | 'AMS' | 'Caligraphic' | 'Fraktur' | 'SansSerif' | 'Script' | 'Typewriter'
  | 'Size1' | 'Size2' | 'Size3' | 'Size4'; // prettier-ignore

export type Alignment = 'left' | 'center' | 'right';

/** What a node inherits: the size of its em and its face. Lengths are in ems of the formula. */
export interface FormulaStyle {
  readonly em: number;
  readonly family: Family;
  readonly bold: boolean;
  readonly italic: boolean;
  readonly align: Alignment;
  /** Null: the colour of the text around the formula. */
  readonly colour: string | null;
}

/** Colours of numbers that are put in. */
export interface PutInColours {
  readonly measured: string;
  readonly predicted: string;
}

/** KaTeX's size classes, in ems: \tiny to \Huge. */
const SIZES = [0.5, 0.6, 0.7, 0.8, 0.9, 1, 1.2, 1.44, 1.728, 2.074, 2.488] as const;

/** Classes that change the family, as KaTeX's style sheet has them; text faces are the report's, as on screen. */
const FAMILY: Readonly<Record<string, Family>> = {
  'accent-body': 'Main', mathnormal: 'Report', mathrm: 'Report', textrm: 'Report', mainrm: 'Main',
  mathit: 'Main', mathbf: 'Main', boldsymbol: 'Math',
  textsf: 'SansSerif', mathsf: 'SansSerif', mathboldsf: 'SansSerif', textboldsf: 'SansSerif',
  mathsfit: 'SansSerif', mathitsf: 'SansSerif', textitsf: 'SansSerif',
  texttt: 'Typewriter', mathtt: 'Typewriter',
  amsrm: 'AMS', mathbb: 'AMS', textbb: 'AMS',
  mathcal: 'Caligraphic',
  mathfrak: 'Fraktur', textfrak: 'Fraktur', mathboldfrak: 'Fraktur', textboldfrak: 'Fraktur',
  mathscr: 'Script', textscr: 'Script',
}; // prettier-ignore

const BOLD = new Set(['textbf', 'mathbf', 'boldsymbol', 'mathboldfrak', 'textboldfrak', 'mathboldsf', 'textboldsf']); // prettier-ignore
const ITALIC = new Set(['textit', 'mathnormal', 'mathit', 'boldsymbol', 'mathsfit', 'mathitsf', 'textitsf']);
const UPRIGHT = new Set(['mathrm', 'mainrm']);

const ALIGN: Readonly<Record<string, Alignment>> = {
  msupsub: 'left', 'op-limits': 'center', 'katex-accent': 'center', 'x-arrow': 'center', mover: 'center',
  munder: 'center', 'col-align-c': 'center', 'col-align-l': 'left', 'col-align-r': 'right', 'svg-align': 'left',
  mfrac: 'center',
}; // prettier-ignore

const DELIMITER: Readonly<Record<string, Family>> = {
  size1: 'Size1', size2: 'Size2', size3: 'Size3', size4: 'Size4',
}; // prettier-ignore

/** The style inside a node with these classes. */
export function styleInside(
  outer: FormulaStyle,
  classes: readonly string[],
  colours: PutInColours,
): FormulaStyle {
  let style = outer;
  for (const name of classes) {
    const family = FAMILY[name];
    if (family) style = { ...style, family };
    if (BOLD.has(name)) style = { ...style, bold: true };
    if (ITALIC.has(name)) style = { ...style, italic: true };
    if (UPRIGHT.has(name)) style = { ...style, italic: false };
    const align = ALIGN[name];
    if (align) style = { ...style, align };
    if (name === 'fm') style = { ...style, colour: colours.measured };
    if (name === 'fp') style = { ...style, colour: colours.predicted };
  }
  return withSize(style, classes);
}

function withSize(style: FormulaStyle, classes: readonly string[]): FormulaStyle {
  const has = (name: string) => classes.includes(name);
  if (has('katex-sizing') || has('fontsize-ensurer')) {
    const from = sizeOf(classes, 'reset-size');
    const to = sizeOf(classes, 'size');
    return from && to ? { ...style, em: (style.em * to) / from } : style;
  }
  if (has('delimsizing')) {
    const family = classes.map((name) => DELIMITER[name]).find((one) => one !== undefined);
    return family ? { ...style, family } : style;
  }
  if (has('delim-size1')) return { ...style, family: 'Size1' };
  if (has('delim-size4')) return { ...style, family: 'Size4' };
  if (has('op-symbol') && has('small-op')) return { ...style, family: 'Size1' };
  if (has('op-symbol') && has('large-op')) return { ...style, family: 'Size2' };
  return style;
}

function sizeOf(classes: readonly string[], prefix: string): number | undefined {
  for (const name of classes) {
    const index = name.startsWith(prefix) ? Number(name.slice(prefix.length)) : NaN;
    if (Number.isInteger(index)) return SIZES[index - 1];
  }
  return undefined;
}

const STYLES: Readonly<Record<Exclude<Family, 'Report'>, readonly string[]>> = {
  Main: ['Regular', 'Bold', 'Italic', 'BoldItalic'],
  Math: ['Italic', 'BoldItalic'],
  SansSerif: ['Regular', 'Bold', 'Italic'],
  Caligraphic: ['Regular', 'Bold'],
  Fraktur: ['Regular', 'Bold'],
  AMS: ['Regular'], Script: ['Regular'], Typewriter: ['Regular'],
  Size1: ['Regular'], Size2: ['Regular'], Size3: ['Regular'], Size4: ['Regular'],
}; // prettier-ignore

function katexFace(family: Exclude<Family, 'Report'>, bold: boolean, italic: boolean): FontName {
  const have = STYLES[family];
  const wanted = `${bold ? 'Bold' : ''}${italic ? 'Italic' : ''}` || 'Regular';
  const fallback =
    bold && have.includes('Bold') ? 'Bold' : italic && have.includes('Italic') ? 'Italic' : have[0];
  return `${family}-${have.includes(wanted) ? wanted : fallback}` as FontName;
}

function reportFace(bold: boolean, italic: boolean): FontName {
  if (bold) return italic ? 'stixSemiBoldItalic' : 'stixSemiBold';
  return italic ? 'stixItalic' : 'stix';
}

/** The face that draws a character: the style's own, else the one KaTeX would fall back to. */
export function faceForCharacter(style: FormulaStyle, codePoint: number): Face {
  const { family, bold, italic } = style;
  const names: FontName[] =
    family === 'Report'
      ? [reportFace(bold, italic), katexFace(italic && !bold ? 'Math' : 'Main', bold, italic)]
      : [katexFace(family, bold, italic)];
  for (const name of [...names, 'Main-Regular', 'AMS-Regular', 'Math-Italic', 'stix'] as const) {
    const face = loadFace(name);
    if (face.has(codePoint)) return face;
  }
  return loadFace(names[0] ?? 'Main-Regular');
}
