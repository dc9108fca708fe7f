import { cssLength } from './css-length.ts';
import type { FormulaBox, FrameItem, RuleItem } from './formula-box.ts';
import type { FormulaStyle } from './formula-style.ts';
import type { KatexNode } from './katex-tree.ts';

const FULL_WIDTH_LINES = ['frac-line', 'overline-line', 'underline-line', 'katex-hline', 'katex-hdashline'];
const FRAMES = ['fbox', 'fcolorbox', 'colorbox', 'katex-sout', 'angl'];
const FRAME_LINE = 0.04;

/** \rule: a filled rectangle of its own size. */
export function boxRule(node: KatexNode, style: FormulaStyle): FormulaBox {
  const css = node.style ?? {};
  const [left, right] = [cssLength(css.marginLeft, style.em), cssLength(css.marginRight, style.em)];
  const width = cssLength(css.borderRightWidth, style.em);
  const height = cssLength(css.borderTopWidth, style.em);
  const bottom = cssLength(css.bottom, style.em);
  const item: RuleItem = { kind: 'rule', x: left, y: -height - bottom, width, height, colour: style.colour };
  return { width: left + width + right, items: width > 0 && height > 0 ? [item] : [] };
}

/** The upright line between columns of an array. */
export function boxSeparator(node: KatexNode, style: FormulaStyle): FormulaBox {
  const css = node.style ?? {};
  const height = cssLength(css.height, style.em);
  const width = cssLength(css.borderRightWidth, style.em);
  const y = -cssLength(css.verticalAlign, style.em) - height;
  return { width: 0, items: [{ kind: 'rule', x: -width / 2, y, width, height, colour: style.colour }] };
}

export function isFullWidthLine(classes: readonly string[]): boolean {
  return FULL_WIDTH_LINES.some((name) => classes.includes(name));
}

/** A line as wide as the box around it: fraction bars, over- and underlines. */
export function boxFullWidthLine(node: KatexNode, style: FormulaStyle): FormulaBox {
  const height = cssLength(node.style?.borderBottomWidth, style.em);
  const item: RuleItem = { kind: 'rule', x: 0, y: -height, width: 0, height, colour: style.colour };
  return {
    width: 0,
    items: [item],
    stretch: (width) => {
      item.width = width;
    },
  };
}

export function isFrame(classes: readonly string[]): boolean {
  return FRAMES.some((name) => classes.includes(name));
}

/** An outline or a ground as wide as the box around it. A line struck through is a rule. */
export function boxFrame(node: KatexNode, style: FormulaStyle): FormulaBox {
  const classes = node.classes ?? [];
  const css = node.style ?? {};
  if (classes.includes('katex-sout')) return boxFullWidthLine(node, style);
  const height = cssLength(css.height, style.em);
  const item: FrameItem = {
    kind: 'frame',
    x: 0,
    y: -height,
    width: 0,
    height,
    line: classes.includes('colorbox') ? 0 : FRAME_LINE * style.em,
    ground: css.backgroundColor ?? null,
    colour: css.borderColor ?? style.colour,
  };
  return {
    width: 0,
    items: [item],
    stretch: (width) => {
      item.width = width;
    },
  };
}
