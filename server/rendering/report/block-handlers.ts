import type { BlockNode } from '#shared/report/schema/report-node.ts';
import { chart } from './handlers/chart.ts';
import { claim } from './handlers/claim.ts';
import { formula } from './handlers/formula.ts';
import { heading } from './handlers/heading.ts';
import { bulletList, orderedList } from './handlers/lists.ts';
import { paragraph } from './handlers/paragraph.ts';
import { plate } from './handlers/plate.ts';
import { staticTable } from './handlers/static-table.ts';
import { trialsTable } from './handlers/trials-table.ts';
import type { BlockHandler, RenderContext } from './render-context.ts';

type Handlers = { readonly [Type in BlockNode['type']]: BlockHandler<Extract<BlockNode, { type: Type }>> };

/** One handler for each kind of block. */
const HANDLERS: Handlers = {
  paragraph,
  heading,
  bulletList,
  orderedList,
  table: staticTable,
  formula,
  chart,
  trialsTable,
  claim,
  plate,
};

/** Draws blocks one after another. */
export function drawBlocks(nodes: readonly BlockNode[], context: RenderContext): void {
  for (const node of nodes) drawBlock(node, context);
}

function drawBlock<Type extends BlockNode['type']>(
  node: Extract<BlockNode, { type: Type }>,
  context: RenderContext,
): void {
  const handler = HANDLERS[node.type] as BlockHandler<typeof node>;
  handler(node, context);
}
