import { breakLines, type LineBreak } from './break-lines.ts';
import { buildItems, textBox, type BoxContent } from './build-items.ts';
import type { InlineRun, TextRun } from './inline-run.ts';
import type { ParagraphItem } from './paragraph-items.ts';

/** A box at its place on a line; `space` is the word space drawn after it, so that words are apart when copied. */
export interface Segment {
  readonly x: number;
  readonly box: BoxContent;
  readonly space: boolean;
}

/** A set line. Lengths in points; `ascent` is from its top to its baseline. */
export interface TextLine {
  readonly segments: readonly Segment[];
  readonly width: number;
  readonly ascent: number;
  readonly height: number;
}

export interface ParagraphShape {
  readonly width: number;
  /** Distance of two baselines; a line with a tall formula takes more. */
  readonly leading: number;
  readonly align: 'left' | 'justify';
  readonly hyphens: boolean;
}

/** Shortfall of a ragged line that counts as a ratio of 1, in points. */
const RAGGEDNESS = 36;
const WITHOUT_HYPHENS = 1.3;
const WITH_HYPHENS = 4;
const ANYTHING = 1e4;
/** Air between lines that are taller than the leading, as a share of it. */
const AIR = 0.08;
/** Where the baseline lies in a line of text, as a share of the leading. */
const BASELINE = 0.71;

/** Sets a sentence: first without hyphens, then with them, at last somehow. */
export function layOutParagraph(runs: readonly InlineRun[], shape: ParagraphShape): readonly TextLine[] {
  const justified = shape.align === 'justify';
  const raggedness = justified ? null : RAGGEDNESS;
  const attempt = (hyphens: boolean, tolerance: number) => {
    const items = buildItems(runs, { hyphens, justified });
    const lines = breakLines(items, { width: shape.width, tolerance, raggedness });
    return lines ? { items, lines } : null;
  };
  const found =
    attempt(false, WITHOUT_HYPHENS) ??
    (shape.hyphens ? attempt(true, WITH_HYPHENS) : null) ??
    attempt(shape.hyphens, ANYTHING);
  if (!found) return [];
  return found.lines.map((line) => setLine(found.items, line, shape));
}

function setLine(
  items: readonly ParagraphItem<BoxContent>[],
  line: LineBreak,
  shape: ParagraphShape,
): TextLine {
  const segments: { x: number; box: BoxContent; space: boolean }[] = [];
  let x = 0;
  for (const item of items.slice(line.from, line.to)) {
    if (item.kind === 'box') {
      segments.push({ x, box: item.content, space: false });
      x += item.width;
    } else if (item.kind === 'glue' && item.width > 0) {
      const last = segments.at(-1);
      if (last) last.space = true;
      x += item.width + (line.ratio >= 0 ? line.ratio * item.stretch : line.ratio * item.shrink);
    }
  }
  x = endLine(segments, items[line.to], x);
  return { segments, width: x, ...lineHeights(segments, shape.leading) };
}

/** A hyphen where the line ends inside a word; a space to copy where it ends between words. */
function endLine(
  segments: { x: number; box: BoxContent; space: boolean }[],
  end: ParagraphItem<BoxContent> | undefined,
  x: number,
): number {
  const last = segments.at(-1);
  if (!last) return x;
  if (end?.kind === 'penalty' && end.flagged && last.box.kind === 'text') {
    const box = textBox(last.box.run, '-');
    segments.push({ x, box, space: false });
    return x + box.width;
  }
  if (end?.kind === 'glue' && end.width > 0) last.space = true;
  return x;
}

function lineHeights(segments: readonly { box: BoxContent }[], leading: number) {
  const above = Math.max(0, ...segments.map(({ box }) => (box.kind === 'part' ? box.ascent : 0)));
  const below = Math.max(0, ...segments.map(({ box }) => (box.kind === 'part' ? box.descent : 0)));
  const ascent = Math.max(leading * BASELINE, above + leading * AIR);
  const descent = Math.max(leading * (1 - BASELINE), below + leading * AIR);
  return { ascent, height: ascent + descent };
}

/** A text on one line, not broken: labels, running heads, cells. */
export function singleLine(runs: readonly TextRun[], leading: number): TextLine {
  let x = 0;
  const segments = runs.map((run) => {
    const box = textBox(run, run.text);
    const segment = { x, box, space: false };
    x += box.width;
    return segment;
  });
  return { segments, width: x, ...lineHeights(segments, leading) };
}
