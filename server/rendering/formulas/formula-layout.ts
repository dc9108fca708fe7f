import { boxBuilder } from './box-node.ts';
import { flatten, type LeafItem } from './formula-box.ts';
import type { PutInColours } from './formula-style.ts';
import { formulaTree } from './katex-tree.ts';

/** A piece of a formula that is not broken across lines. Lengths in ems of the formula. */
export interface FormulaPart {
  readonly width: number;
  readonly height: number;
  readonly depth: number;
  readonly items: readonly LeafItem[];
}

/** A laid-out formula, or why it cannot be. A line may break between its parts. */
export type FormulaLayout =
  | {
      readonly ok: true;
      readonly parts: readonly FormulaPart[];
      readonly width: number;
      readonly height: number;
      readonly depth: number;
    }
  | { readonly ok: false; readonly reason: string };

const CACHE_LIMIT = 5_000;
const cache = new Map<string, FormulaLayout>();

/**
 * Lays out a formula by KaTeX's own box tree, so that it is the one on the screen.
 *
 * @param display - true: a formula on its own line, with tall sums and fractions
 */
export function layOutFormula(latex: string, display: boolean, colours: PutInColours): FormulaLayout {
  const key = `${display ? 'display' : 'inline'} ${colours.measured} ${colours.predicted} ${latex}`;
  const known = cache.get(key);
  if (known) return known;
  const layout = compute(latex, display, colours);
  if (cache.size > CACHE_LIMIT) cache.clear();
  cache.set(key, layout);
  return layout;
}

function compute(latex: string, display: boolean, colours: PutInColours): FormulaLayout {
  const tree = formulaTree(latex, display);
  if (!tree.ok) return tree;
  const { inline } = boxBuilder(colours);
  const parts = tree.bases.map((base): FormulaPart => {
    const align = display ? 'center' : 'left';
    const style = { em: 1, family: 'Report', bold: false, italic: false, align, colour: null } as const;
    const box = inline(base.children ?? [], style);
    return { width: box.width, height: base.height, depth: base.depth, items: flatten(box.items) };
  });
  return {
    ok: true,
    parts,
    width: parts.reduce((sum, part) => sum + part.width, 0),
    height: Math.max(0, ...parts.map((part) => part.height)),
    depth: Math.max(0, ...parts.map((part) => part.depth)),
  };
}
