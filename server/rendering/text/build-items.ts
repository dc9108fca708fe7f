import type { FormulaPart } from '../formulas/formula-layout.ts';
import { shapeText, stackHeights, type ShapedText } from '../fonts/shape-text.ts';
import { hyphenate } from './hyphenate.ts';
import type { FormulaRun, InlineRun, TextRun, TextStyle } from './inline-run.ts';
import { FORCED, type ParagraphItem } from './paragraph-items.ts';

/** What a box of a paragraph draws. Lengths in points. */
export type BoxContent = {
  readonly width: number;
  readonly ascent: number;
  readonly descent: number;
} & (
  | { readonly kind: 'text'; readonly run: TextRun; readonly shaped: ShapedText }
  | { readonly kind: 'part'; readonly run: FormulaRun; readonly part: FormulaPart }
);

export interface BuildOptions {
  readonly hyphens: boolean;
  readonly justified: boolean;
}

const HYPHEN_COST = 60;
const DASH_COST = 30;
const FORMULA_BREAK_COST = 400;
const STRETCH = 0.5;
const SHRINK = 0.33;
const FILL = 1e5;
/** Ascent of letters as a share of the face's, which leaves room for accents on capitals. */
const LETTER_ASCENT = 0.85;

/** The space between words in a style. */
export function wordSpace(style: TextStyle): number {
  return shapeText(style.stack, ' ').width * style.size;
}

/** Room for the dashed box at each side of what it holds. */
export const DASHED_ROOM = 2;

export function textBox(run: TextRun, text: string): BoxContent {
  const shaped = shapeText(run.style.stack, text);
  const heights = stackHeights(run.style.stack);
  const { size, rise = 0 } = run.style;
  return {
    kind: 'text',
    run,
    shaped,
    width: shaped.width * size + (run.dashed === undefined ? 0 : 2 * DASHED_ROOM),
    ascent: heights.ascent * LETTER_ASCENT * size + Math.max(0, rise),
    descent: heights.descent * size,
  };
}

/** Boxes, glue and penalties of a sentence, closed by filling glue and a forced break. */
export function buildItems(runs: readonly InlineRun[], options: BuildOptions): ParagraphItem<BoxContent>[] {
  const items: ParagraphItem<BoxContent>[] = [];
  for (const run of runs) {
    if (run.kind === 'break') items.push(...lineEnd());
    else if (run.kind === 'formula') items.push(...formulaItems(run));
    else if (run.whole) items.push(boxItem(textBox(run, run.text)));
    else items.push(...textItems(run, options));
  }
  return [...items, ...lineEnd()];
}

function boxItem(content: BoxContent): ParagraphItem<BoxContent> {
  return { kind: 'box', width: content.width, content };
}

function lineEnd(): ParagraphItem<BoxContent>[] {
  return [
    { kind: 'glue', width: 0, stretch: FILL, shrink: 0 },
    { kind: 'penalty', width: 0, cost: FORCED, flagged: false },
  ];
}

function formulaItems(run: FormulaRun): ParagraphItem<BoxContent>[] {
  return run.parts.flatMap((part, i) => {
    const { size } = run;
    const content: BoxContent = {
      kind: 'part',
      run,
      part,
      width: part.width * size,
      ascent: part.height * size,
      descent: part.depth * size,
    };
    const between: ParagraphItem<BoxContent> = {
      kind: 'penalty',
      width: 0,
      cost: FORMULA_BREAK_COST,
      flagged: false,
    };
    return i === 0 ? [boxItem(content)] : [between, boxItem(content)];
  });
}

function textItems(run: TextRun, options: BuildOptions): ParagraphItem<BoxContent>[] {
  const space = wordSpace(run.style);
  const glue: ParagraphItem<BoxContent> = {
    kind: 'glue',
    width: space,
    stretch: options.justified ? space * STRETCH : 0,
    shrink: options.justified ? space * SHRINK : 0,
  };
  return run.text
    .split(/( +)/u)
    .filter((piece) => piece !== '')
    .flatMap((piece) => (piece.startsWith(' ') ? [glue] : wordItems(run, piece, options)));
}

/** A word with the places where it may be broken: by hyphenation, and after its own hyphens, dashes and strokes. */
function wordItems(run: TextRun, word: string, options: BuildOptions): ParagraphItem<BoxContent>[] {
  const hyphenWidth = shapeText(run.style.stack, '-').width * run.style.size;
  const pieces = options.hyphens ? hyphenate(word) : [word];
  return pieces.flatMap((piece, i) => {
    const parts = piece.split(/(?<=[\p{L}\p{N}][–—\-/])(?=[\p{L}\p{N}])/u).flatMap((part, j) => {
      const dash: ParagraphItem<BoxContent> = { kind: 'penalty', width: 0, cost: DASH_COST, flagged: false };
      const box = boxItem(textBox(run, part));
      return j === 0 ? [box] : [dash, box];
    });
    const hyphen: ParagraphItem<BoxContent> = {
      kind: 'penalty',
      width: hyphenWidth,
      cost: HYPHEN_COST,
      flagged: true,
    };
    return i === 0 ? parts : [hyphen, ...parts];
  });
}
