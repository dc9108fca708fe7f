import type { Glyph } from 'fontkit';
import type { Face } from '../fonts/load-face.ts';

/** One glyph of a formula. All lengths are in ems of the formula, y down from the baseline. */
export interface GlyphItem {
  readonly kind: 'glyph';
  readonly x: number;
  readonly y: number;
  readonly face: Face;
  readonly glyph: Glyph;
  readonly size: number;
  readonly colour: string | null;
}

/** A filled rectangle: fraction bars, lines of tables, \rule. Its width may be set once the box around it is known. */
export interface RuleItem {
  readonly kind: 'rule';
  readonly x: number;
  readonly y: number;
  width: number;
  readonly height: number;
  readonly colour: string | null;
}

/** A rectangle with an outline or a ground: \boxed, \colorbox. */
export interface FrameItem {
  readonly kind: 'frame';
  readonly x: number;
  readonly y: number;
  width: number;
  readonly height: number;
  readonly line: number;
  readonly ground: string | null;
  readonly colour: string | null;
}

/** One shape of a drawing: path data in the drawing's own units, or a line between shares of its box. */
export type Shape =
  | { readonly path: string }
  | { readonly line: { readonly x1: string; readonly y1: string; readonly x2: string; readonly y2: string } };

/** A drawing that KaTeX makes as SVG: roots, stretched accents, braces, arrows, strikes. */
export interface DrawingItem {
  readonly kind: 'drawing';
  x: number;
  readonly y: number;
  width: number;
  readonly height: number;
  readonly shapes: readonly Shape[];
  readonly viewBox: readonly number[] | null;
  readonly aspect: string;
  readonly em: number;
  readonly colour: string | null;
}

export type LeafItem = GlyphItem | RuleItem | FrameItem | DrawingItem;

export interface GroupItem {
  readonly kind: 'group';
  readonly x: number;
  readonly y: number;
  readonly items: readonly FormulaItem[];
}

export type FormulaItem = LeafItem | GroupItem;

/** A laid-out node. `stretch` gives parts as wide as the box around them their width, once that is known. */
export interface FormulaBox {
  readonly width: number;
  readonly items: readonly FormulaItem[];
  readonly stretch?: ((width: number) => void) | undefined;
}

export const EMPTY_BOX: FormulaBox = { width: 0, items: [] };

/** The items moved by (x, y). */
export function moved(items: readonly FormulaItem[], x: number, y: number): readonly FormulaItem[] {
  return (x === 0 && y === 0) || items.length === 0 ? items : [{ kind: 'group', x, y, items }];
}

/** All leaves with their places, groups resolved. Widths must be known by then. */
export function flatten(items: readonly FormulaItem[], x = 0, y = 0, into: LeafItem[] = []): LeafItem[] {
  for (const item of items) {
    if (item.kind === 'group') flatten(item.items, x + item.x, y + item.y, into);
    else into.push({ ...item, x: x + item.x, y: y + item.y });
  }
  return into;
}
