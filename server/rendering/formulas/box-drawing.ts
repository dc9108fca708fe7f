import { cssLength } from './css-length.ts';
import type { DrawingItem, FormulaBox, Shape } from './formula-box.ts';
import type { FormulaStyle } from './formula-style.ts';
import type { KatexNode } from './katex-tree.ts';

/** Whether a node is the span that holds one SVG element. */
export function holdsDrawing(node: KatexNode): boolean {
  const only = node.children?.length === 1 ? node.children[0] : undefined;
  return only !== undefined && only.attributes !== undefined && only.classes === undefined;
}

function shapesOf(svg: KatexNode): Shape[] {
  return (svg.children ?? []).map((child) => {
    if (child.pathName !== undefined) return { path: /d="([^"]*)"/u.exec(child.toMarkup())?.[1] ?? '' };
    const { x1 = '0', y1 = '0', x2 = '0', y2 = '0' } = child.attributes ?? {};
    return { line: { x1, y1, x2, y2 } };
  });
}

function drawingItem(svg: KatexNode, style: FormulaStyle, span: KatexNode): DrawingItem {
  const attributes = svg.attributes ?? {};
  const height = cssLength(span.style?.height ?? attributes.height, style.em);
  const fixed = /width:\s*([\d.]+)em/u.exec(attributes.style ?? '')?.[1];
  const width = fixed === undefined ? cssLength(span.style?.width, style.em) : Number(fixed) * style.em;
  return {
    kind: 'drawing',
    x: 0,
    y: -height,
    width,
    height,
    shapes: shapesOf(svg),
    viewBox: attributes.viewBox?.split(' ').map(Number) ?? null,
    aspect: attributes.preserveAspectRatio ?? 'xMidYMid',
    em: style.em,
    colour: style.colour,
  };
}

/** A drawing: of its own width if it has one, else as wide as the box around it. */
export function boxDrawing(span: KatexNode, style: FormulaStyle): FormulaBox {
  const svg = span.children?.[0];
  if (!svg) return { width: 0, items: [] };
  const item = drawingItem(svg, style, span);
  if (item.width > 0) return { width: item.width, items: [item] };
  return {
    width: cssLength(span.style?.minWidth, style.em),
    items: [item],
    stretch: (width) => {
      item.width = width;
    },
  };
}

/** Where the parts of a brace or a double arrow lie, as shares of the whole; from KaTeX's style sheet. */
const PARTS: Readonly<Record<string, { readonly from: number; readonly share: number }>> = {
  'halfarrow-left': { from: 0, share: 0.502 },
  'halfarrow-right': { from: 0.498, share: 0.502 },
  'brace-left': { from: 0, share: 0.251 },
  'brace-center': { from: 0.25, share: 0.5 },
  'brace-right': { from: 0.749, share: 0.251 },
};

/** Braces and double arrows: two or three drawings side by side, as wide together as the box around them. */
export function boxDrawingParts(node: KatexNode, style: FormulaStyle): FormulaBox {
  const placed = (node.children ?? []).flatMap((span) => {
    const svg = span.children?.[0];
    const name = span.classes?.find((one) => one in PARTS);
    const part = name === undefined ? undefined : PARTS[name];
    return svg && part ? [{ item: drawingItem(svg, style, span), part }] : [];
  });
  return {
    width: cssLength(node.style?.minWidth, style.em),
    items: placed.map(({ item }) => item),
    stretch: (width) => {
      for (const { item, part } of placed) {
        item.x = width * part.from;
        item.width = width * part.share;
      }
    },
  };
}
