/**
 * What a paragraph is broken from, after Knuth and Plass, "Breaking Paragraphs into Lines", Software: Practice and
 * Experience 11 (1981), 1119-1184: boxes that stay whole, glue between them, penalties where a line may end.
 */
export interface Box<Content> {
  readonly kind: 'box';
  readonly width: number;
  readonly content: Content;
}

/** Space that may stretch or shrink, and at which a line may end when a box stands before it. */
export interface Glue {
  readonly kind: 'glue';
  readonly width: number;
  readonly stretch: number;
  readonly shrink: number;
}

/** A place where a line may end at a cost; `width` is added there (a hyphen). */
export interface Penalty {
  readonly kind: 'penalty';
  readonly width: number;
  readonly cost: number;
  /** Two lines in a row that end at flagged penalties cost extra. */
  readonly flagged: boolean;
}

export type ParagraphItem<Content> = Box<Content> | Glue | Penalty;

/** A line must end here. */
export const FORCED = -10_000;
/** A line must not end here. */
export const FORBIDDEN = 10_000;

export function isForcedBreak(item: ParagraphItem<unknown> | undefined): boolean {
  return item?.kind === 'penalty' && item.cost <= FORCED;
}
