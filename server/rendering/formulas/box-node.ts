import { boxDrawing, boxDrawingParts, holdsDrawing } from './box-drawing.ts';
import { boxFrame, boxFullWidthLine, boxRule, boxSeparator, isFrame, isFullWidthLine } from './box-rules.ts';
import { boxVlist } from './box-vlist.ts';
import { cssLength } from './css-length.ts';
import { EMPTY_BOX, moved, type FormulaBox, type FormulaItem, type GlyphItem } from './formula-box.ts';
import { faceForCharacter, styleInside, type FormulaStyle, type PutInColours } from './formula-style.ts';
import type { KatexNode } from './katex-tree.ts';

/** Classes of nodes that only hold room open. */
const STRUTS = ['katex-strut', 'pstrut', 'vlist-s', 'katex-fix'];
const LAPS = ['llap', 'rlap', 'clap'];
const NULL_DELIMITER = 0.12;
const INVISIBLE = new Set([0x200b, 0x2061]);
const NO_BREAK_SPACE = 0xa0;
const SPACE = 0x20;

/** Builds boxes from KaTeX's nodes with these colours for numbers that are put in. */
export function boxBuilder(colours: PutInColours) {
  const styleOf = (outer: FormulaStyle, node: KatexNode): FormulaStyle => {
    const style = styleInside(outer, node.classes ?? [], colours);
    return node.style?.color === undefined ? style : { ...style, colour: node.style.color };
  };

  function inline(nodes: readonly KatexNode[], style: FormulaStyle): FormulaBox {
    let width = 0;
    const items: FormulaItem[] = [];
    const stretches: ((width: number) => void)[] = [];
    for (const node of nodes) {
      const box = boxOf(node, style);
      items.push(...moved(box.items, width, 0));
      if (box.stretch) stretches.push(box.stretch);
      width += box.width;
    }
    if (stretches.length === 0) return { width, items };
    return { width, items, stretch: (full) => stretches.forEach((stretch) => stretch(full)) };
  }

  function boxOf(node: KatexNode, outer: FormulaStyle): FormulaBox {
    if (node.text !== undefined && node.italic !== undefined) return boxSymbol(node, styleOf(outer, node));
    if (!node.classes) return inline(node.children ?? [], outer);
    if (STRUTS.some((name) => node.classes?.includes(name))) return EMPTY_BOX;
    const style = styleOf(outer, node);
    if (node.classes.includes('katex-rule')) return boxRule(node, style);
    if (node.classes.includes('vertical-separator')) return boxSeparator(node, style);
    return withMargins(node, contentOf(node, style), style);
  }

  function contentOf(node: KatexNode, style: FormulaStyle): FormulaBox {
    const classes = node.classes ?? [];
    if (classes.includes('vlist-t')) return boxVlist(node, style, styleOf, inline);
    if (classes.includes('nulldelimiter')) return { width: NULL_DELIMITER * style.em, items: [] };
    if (isFullWidthLine(classes)) return boxFullWidthLine(node, style);
    if (isFrame(classes)) return boxFrame(node, style);
    if (classes.includes('katex-stretchy') && (node.children?.length ?? 0) > 1) {
      return boxDrawingParts(node, style);
    }
    if (LAPS.some((name) => classes.includes(name))) return lapped(node, style);
    if (holdsDrawing(node)) return boxDrawing(node, style);
    return inline(node.children ?? [], style);
  }

  /** \llap, \rlap, \clap: drawn, but without width. */
  function lapped(node: KatexNode, style: FormulaStyle): FormulaBox {
    const inner =
      node.children?.find((child) => child.classes?.includes('katex-inner')) ?? node.children?.[0];
    if (!inner) return EMPTY_BOX;
    const box = inline(inner.children ?? [], styleOf(style, inner));
    const shift = node.classes?.includes('llap')
      ? -box.width
      : node.classes?.includes('clap')
        ? -box.width / 2
        : 0;
    return { width: 0, items: moved(box.items, shift, 0) };
  }

  return { inline };
}

function boxSymbol(node: KatexNode, style: FormulaStyle): FormulaBox {
  const text = node.text ?? '';
  const items: GlyphItem[] = [];
  let x = 0;
  for (const character of text) {
    const codePoint = character.codePointAt(0) ?? SPACE;
    if (INVISIBLE.has(codePoint)) continue;
    const drawn = codePoint === NO_BREAK_SPACE ? SPACE : codePoint;
    const face = faceForCharacter(style, drawn);
    const glyph = face.glyph(drawn);
    const { em: size, colour } = style;
    if (drawn !== SPACE) items.push({ kind: 'glyph', x, y: 0, face, glyph, size, colour });
    x += (glyph.advanceWidth / face.font.unitsPerEm) * size;
  }
  const css = node.style ?? {};
  const left = cssLength(css.marginLeft, style.em) + cssLength(css.paddingLeft, style.em);
  const right = cssLength(css.marginRight, style.em);
  // KaTeX writes the italic correction as the right margin; a margin of the symbol's own takes its place.
  const italic = Math.max(0, node.italic ?? 0) * style.em;
  return {
    width: left + x + (css.marginRight === undefined ? italic : right),
    items: moved(items, left, cssLength(css.top, style.em)),
  };
}

/** Room that classes of KaTeX's style sheet give: left and right padding, then left and right margin, in ems. */
const ROOM: Readonly<Record<string, readonly [number, number, number, number]>> = {
  'x-arrow-pad': [0.5, 0.5, 0, 0],
  boxpad: [0.3, 0.3, 0, 0],
  'cancel-pad': [0.2, 0.2, 0, 0],
  'cancel-lap': [0, 0, -0.2, -0.2],
  'katex-root': [0, 0, 5 / 18, -10 / 18],
  anglpad: [0.03889, 0.03889, 0, 0],
};

function withMargins(node: KatexNode, box: FormulaBox, style: FormulaStyle): FormulaBox {
  const classes = node.classes ?? [];
  const css = node.style ?? {};
  const { em } = style;
  let marginLeft = cssLength(css.marginLeft, em);
  let marginRight = cssLength(css.marginRight, em);
  let padLeft = cssLength(css.paddingLeft, em);
  let padRight = cssLength(css.paddingRight, em);
  for (const name of classes) {
    const room = ROOM[name];
    if (!room) continue;
    padLeft += room[0] * em;
    padRight += room[1] * em;
    marginLeft += room[2] * em;
    marginRight += room[3] * em;
  }
  const width = ownWidth(classes, css, box.width, em);
  const around = marginLeft + padLeft + padRight + marginRight;
  if (classes.includes('mspace') || classes.includes('arraycolsep')) {
    return { width: marginLeft + width + marginRight, items: [] };
  }
  const dx = marginLeft + padLeft + cssLength(css.left, em);
  const dy = cssLength(css.top, em) - cssLength(css.bottom, em) - cssLength(css.verticalAlign, em);
  const { stretch } = box;
  return {
    width: around + width,
    items: moved(box.items, dx, dy),
    stretch: stretch && ((full) => stretch(full - around)),
  };
}

function ownWidth(
  classes: readonly string[],
  css: Readonly<Record<string, string | undefined>>,
  natural: number,
  em: number,
): number {
  if (classes.includes('katex-thinbox') || classes.includes('mtr-glue')) return 0;
  if (css.width?.endsWith('em') && !classes.includes('katex-overlay')) return cssLength(css.width, em);
  if (classes.includes('accent-body') && !classes.includes('accent-full')) return 0;
  return natural;
}
