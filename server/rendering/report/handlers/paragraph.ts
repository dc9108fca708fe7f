import type { ParagraphNode } from '#shared/report/schema/report-node.ts';
import { inlineRuns } from '../inline-runs.ts';
import { BODY } from '../print-style.ts';
import type { BlockHandler } from '../render-context.ts';
import { textBlock } from '../text-block.ts';

export const paragraph: BlockHandler<ParagraphNode> = (node, context) => {
  textBlock(inlineRuns(node.content, BODY, context), BODY, 'P', context, context.space);
};
