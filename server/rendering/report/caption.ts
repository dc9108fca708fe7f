import type { StructureElement } from '../pdf/pdf-document.ts';
import { drawLines, LinesOwner } from '../text/draw-lines.ts';
import type { InlineRun } from '../text/inline-run.ts';
import type { TextLine } from '../text/layout-paragraph.ts';
import { CAPTION, INK, textStyle } from './print-style.ts';
import type { RenderContext } from './render-context.ts';
import { layOutLines } from './text-block.ts';

/** A caption: "Figure 4." in ink, then what it says. */
export function layOutCaption(label: string, text: string, width: number) {
  const runs: InlineRun[] = [
    { kind: 'text', text: `${label}. `, style: textStyle(CAPTION, 'bodyBold', INK) },
    { kind: 'text', text: text.trim(), style: textStyle(CAPTION) },
  ];
  return layOutLines(runs, CAPTION, width);
}

/** Draws a caption inside the element of what it names. */
export function drawCaption(
  lines: readonly TextLine[],
  figure: StructureElement,
  y: number,
  context: RenderContext,
): void {
  const { writer, left } = context;
  const element = writer.element('Caption');
  figure.add(element);
  drawLines(writer, lines, { x: left, y, owner: new LinesOwner(writer, element, 'Caption') });
}
