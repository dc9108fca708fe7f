import type { BulletListNode, ListItemNode, OrderedListNode } from '#shared/report/schema/report-node.ts';
import { shapeText } from '../../fonts/shape-text.ts';
import { TextPen } from '../../pdf/text-pen.ts';
import { BODY, INK_3 } from '../print-style.ts';
import type { BlockHandler, RenderContext } from '../render-context.ts';

const INDENT = 19;
const SPACE_INSIDE = 3;
const SPACE_ABOVE = 6;
/** Where the baseline of the first line lies, as a share of the leading. */
const BASELINE = 0.71;

export const bulletList: BlockHandler<BulletListNode> = (node, context) => {
  list(node.content, () => '•', context);
};

export const orderedList: BlockHandler<OrderedListNode> = (node, context) => {
  const { start, type } = node.attrs;
  list(node.content, (i) => `${itemNumber(start + i, type ?? '1')}.`, context);
};

function list(
  items: readonly ListItemNode[],
  label: (index: number) => string,
  context: RenderContext,
): void {
  const { writer } = context;
  const element = writer.element('L');
  context.element.add(element);
  items.forEach((item, i) => {
    const entry = writer.element('LI');
    element.add(entry);
    drawLabel(label(i), i === 0 ? SPACE_ABOVE : SPACE_INSIDE, { ...context, element: entry });
    const body = writer.element('LBody');
    entry.add(body);
    const inside = { ...context, element: body, left: context.left + INDENT, width: context.width - INDENT };
    const [first, ...others] = item.content ?? [];
    // The first line stands at the label's height, so the space above it is the label's.
    if (first) context.blocks([first], { ...inside, space: 0 });
    context.blocks(others, { ...inside, space: SPACE_INSIDE });
  });
}

/** The label waits for the item's first line, so that both stand on one page. */
function drawLabel(text: string, space: number, context: RenderContext): void {
  const { writer, flow, left } = context;
  const shaped = shapeText('body', text);
  const label = writer.element('Lbl');
  context.element.add(label);
  flow.keepWithNext(space, 0, (y) => {
    writer.content(label, 'Lbl', () => {
      const pen = new TextPen(writer);
      const x = left + INDENT - 6 - shaped.width * BODY.size;
      pen.text(shaped, BODY.size, x, y + BODY.leading * BASELINE, INK_3);
      pen.end();
    });
  });
}

const ROMAN: readonly (readonly [number, string])[] = [
  [1000, 'm'], [900, 'cm'], [500, 'd'], [400, 'cd'], [100, 'c'], [90, 'xc'], [50, 'l'], [40, 'xl'],
  [10, 'x'], [9, 'ix'], [5, 'v'], [4, 'iv'], [1, 'i'],
]; // prettier-ignore

/** A list's number in figures, letters or Roman figures. */
export function itemNumber(value: number, type: '1' | 'a' | 'A' | 'i' | 'I'): string {
  if (type === '1' || value < 1) return String(value);
  if (type === 'a' || type === 'A') {
    const letters = letterNumber(value);
    return type === 'a' ? letters : letters.toUpperCase();
  }
  let rest = value;
  let text = '';
  for (const [worth, sign] of ROMAN) {
    while (rest >= worth) {
      text += sign;
      rest -= worth;
    }
  }
  return type === 'i' ? text : text.toUpperCase();
}

function letterNumber(value: number): string {
  const last = String.fromCharCode(97 + ((value - 1) % 26));
  const before = Math.floor((value - 1) / 26);
  return before === 0 ? last : letterNumber(before) + last;
}
