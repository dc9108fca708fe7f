import { cssLength } from './css-length.ts';
import { moved, type FormulaBox, type FormulaItem } from './formula-box.ts';
import type { FormulaStyle } from './formula-style.ts';
import type { KatexNode } from './katex-tree.ts';

/** Lays out nodes side by side in a style. */
export type LayOutInline = (nodes: readonly KatexNode[], style: FormulaStyle) => FormulaBox;

interface Row {
  readonly box: FormulaBox;
  readonly y: number;
  readonly marginLeft: number;
  readonly marginRight: number;
  readonly style: FormulaStyle;
}

/**
 * A vertical list. Each child hangs from a strut that lifts it to its place, so that its baseline lies at
 * `top` + the strut's height below the list's own.
 */
export function boxVlist(
  node: KatexNode,
  inside: FormulaStyle,
  styleOf: (outer: FormulaStyle, child: KatexNode) => FormulaStyle,
  layOut: LayOutInline,
): FormulaBox {
  const list = node.children?.[0]?.children?.[0];
  const rows: Row[] = (list?.children ?? []).map((child) => {
    const style = styleOf(inside, child);
    const strut = child.children?.find((one) => one.classes?.includes('pstrut'));
    const rest = child.children?.filter((one) => one !== strut) ?? [];
    return {
      box: layOut(rest, style),
      y: cssLength(child.style?.top, inside.em) + cssLength(strut?.style?.height, inside.em),
      marginLeft: cssLength(child.style?.marginLeft, inside.em),
      marginRight: cssLength(child.style?.marginRight, inside.em),
      style,
    };
  });
  const width = Math.max(0, ...rows.map((row) => row.box.width + row.marginLeft + row.marginRight));
  const items: FormulaItem[] = [];
  for (const row of rows) {
    const inner = width - row.marginLeft - row.marginRight;
    row.box.stretch?.(inner);
    const isStretched = row.box.stretch !== undefined && row.box.items.length === 1;
    const own = isStretched ? Math.max(inner, row.box.width) : row.box.width;
    const slack = inner - own;
    const shift = row.style.align === 'center' ? slack / 2 : row.style.align === 'right' ? slack : 0;
    items.push(...moved(row.box.items, row.marginLeft + shift, row.y));
  }
  return { width, items };
}
