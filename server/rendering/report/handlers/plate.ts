import type { PlateNode } from '#shared/report/schema/report-node.ts';
import { drawCaption, layOutCaption } from '../caption.ts';
import { noticeBlock } from '../notice.ts';
import type { BlockHandler } from '../render-context.ts';

const SPACE_ABOVE = 12;
const SPACE_BELOW = 10;
const CAPTION_GAP = 5;
/** A plate takes at most this share of a page's height. */
const TALLEST = 0.55;

/** A picture with its caption. */
export const plate: BlockHandler<PlateNode> = (node, context) => {
  const { writer, flow, left, width } = context;
  const { anchor, sha, caption: text, alt } = node.attrs;
  const number = context.numbers.plates.get(anchor) ?? 0;
  const bytes = context.plates.get(sha);
  if (!bytes) {
    noticeBlock(`Plate ${number} cannot be shown: its file is missing. Upload the picture again.`, context);
    return;
  }
  const picture = writer.openPicture(bytes);
  const tallest = (flow.frame.bottom - flow.frame.top) * TALLEST;
  const scale = Math.min(width / picture.width, tallest / picture.height);
  const box = { width: picture.width * scale, height: picture.height * scale };
  const caption = layOutCaption(`Plate ${number}`, text, width);
  flow.begin(SPACE_ABOVE, box.height + CAPTION_GAP + caption.height);
  const top = flow.y;
  const x = left + (width - box.width) / 2;
  const figure = writer.element('Figure', {
    alt: alt || text || `Plate ${number}`,
    placement: 'Block',
    bbox: [x, top, x + box.width, top + box.height],
  });
  context.element.add(figure);
  writer.content(figure, 'Figure', () => writer.picture(picture, { x, y: top, ...box }));
  drawCaption(caption.lines, figure, top + box.height + CAPTION_GAP, context);
  flow.y = top + box.height + CAPTION_GAP + caption.height + SPACE_BELOW;
};
