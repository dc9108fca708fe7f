import type { Hue } from '#shared/evidence/findings.ts';
import type { ChartTheme } from '#shared/report/charts/chart-theme.ts';
import type { FontStack } from '../fonts/font-stacks.ts';
import type { PutInColours } from '../formulas/formula-style.ts';
import type { TextStyle } from '../text/inline-run.ts';

/** Colours of paper: always the light ones. */
export const INK = '#10262D';
export const INK_2 = '#3C525A';
export const INK_3 = '#566A71';
export const RULE = '#C3CECE';
export const HAIR = '#DDE4E3';
export const WATER = '#086C9A';
export const WATER_FILL = '#8EC4DE';
export const COPPER = '#8D4A00';
export const LEAK = '#B0154F';

/** Charts on paper. */
export const PRINT_THEME: ChartTheme = {
  ink: INK,
  ink2: INK_2,
  ink3: INK_3,
  paper: '#FFFFFF',
  hair: HAIR,
  water: WATER,
  copper: COPPER,
  leak: LEAK,
  uiFace: '"Hanken Grotesk"',
  reportFace: '"STIX Two Text"',
};

export const PUT_IN_COLOURS: PutInColours = { measured: WATER, predicted: COPPER };

const HUES: Readonly<Record<Hue, string>> = {
  measured: WATER,
  predicted: COPPER,
  difference: LEAK,
  count: INK,
};

export function hueColour(hue: Hue): string {
  return HUES[hue];
}

/** Points for a CSS pixel: charts are drawn in pixels. */
export const POINTS_PER_PIXEL = 0.75;
/** Size of a formula's em for a text size. */
export const FORMULA_SCALE = 1.04;
/** Strength of an ink line, and of a hairline. */
export const INK_LINE = 0.94;
export const HAIR_LINE = 0.75;

/** A text face in the four styles that marks ask for. */
export interface TextFace {
  readonly size: number;
  readonly leading: number;
  readonly colour: string;
  readonly regular: FontStack;
  readonly italic: FontStack;
  readonly bold: FontStack;
  readonly boldItalic: FontStack;
}

const REPORT = {
  regular: 'body',
  italic: 'bodyItalic',
  bold: 'bodyBold',
  boldItalic: 'bodyBoldItalic',
} as const;
const MEDIUM = {
  regular: 'bodyMedium',
  italic: 'bodyMediumItalic',
  bold: 'bodyBold',
  boldItalic: 'bodyBoldItalic',
} as const;
const TABLE = { regular: 'ui', italic: 'bodyItalic', bold: 'uiBold', boldItalic: 'bodyBoldItalic' } as const;
const TABLE_HEAD = { ...TABLE, regular: 'uiMedium', bold: 'uiBold' } as const;

export const BODY: TextFace = { ...REPORT, size: 11.5, leading: 17, colour: INK };
export const CAPTION: TextFace = { ...REPORT, size: 10.1, leading: 14.2, colour: INK_2 };
export const CELL: TextFace = { ...TABLE, size: 9.4, leading: 13.5, colour: INK };
export const CELL_HEAD: TextFace = { ...TABLE_HEAD, size: 9.4, leading: 13.5, colour: INK_2 };
export const CLAIM: TextFace = { ...MEDIUM, size: 11.5, leading: 16.5, colour: INK };
export const CLAIM_WHY: TextFace = { ...TABLE, size: 9.4, leading: 13.5, colour: INK_2 };
export const SECTION_HEADING: TextFace = { ...MEDIUM, size: 17.25, leading: 22, colour: INK };
export const HEADINGS: Readonly<Record<2 | 3, TextFace>> = {
  2: { ...MEDIUM, size: 13.5, leading: 18, colour: INK },
  3: { ...REPORT, regular: 'bodyBold', italic: 'bodyBoldItalic', size: 11.5, leading: 17, colour: INK },
};
export const RUNNING: TextFace = { ...REPORT, size: 9.75, leading: 13.5, colour: INK_3 };

/** Size and lift of the small letter on a tied number, as shares of the text's size. */
export const LETTER = { scale: 0.59, rise: 0.4 } as const;

export function textStyle(face: TextFace, stack: FontStack = face.regular, colour = face.colour): TextStyle {
  return { stack, size: face.size, colour };
}
