import { BODY, LEAK, textStyle } from './print-style.ts';
import type { RenderContext } from './render-context.ts';
import { textBlock } from './text-block.ts';

/** What stands in the place of a part that cannot be drawn: its reason, in the dashed box of what is not finished. */
export function noticeBlock(sentence: string, context: RenderContext): void {
  const style = textStyle(BODY, 'bodyItalic', LEAK);
  const words = sentence.split(' ').flatMap((word, i) => [i === 0 ? word : ` ${word}`]);
  const runs = words.map((text) => ({ kind: 'text' as const, text, style }));
  textBlock(runs, BODY, 'P', context, context.space);
}
