import { LinesOwner } from '../text/draw-lines.ts';
import type { InlineRun } from '../text/inline-run.ts';
import { layOutParagraph } from '../text/layout-paragraph.ts';
import type { TextFace } from './print-style.ts';
import type { RenderContext } from './render-context.ts';

/** Sets runs as a block of text of their own element, broken over pages where need be. */
export function textBlock(
  runs: readonly InlineRun[],
  face: TextFace,
  tag: string,
  context: Pick<RenderContext, 'writer' | 'flow' | 'element' | 'left' | 'width'>,
  space: number,
): void {
  if (runs.length === 0) return;
  const { writer, flow, left, width } = context;
  const lines = layOutParagraph(runs, { width, leading: face.leading, align: 'left', hyphens: true });
  const element = writer.element(tag);
  context.element.add(element);
  flow.lines(lines, new LinesOwner(writer, element, tag), { x: left }, space);
}

/** Lines of runs at a width, and their height together. */
export function layOutLines(runs: readonly InlineRun[], face: TextFace, width: number) {
  const lines = layOutParagraph(runs, { width, leading: face.leading, align: 'left', hyphens: true });
  return { lines, height: lines.reduce((sum, line) => sum + line.height, 0) };
}
