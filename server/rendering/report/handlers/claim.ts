import { claimLine } from '#shared/report/claim-line.ts';
import type { ClaimNode } from '#shared/report/schema/report-node.ts';
import { shapeText } from '../../fonts/shape-text.ts';
import { fillColour, length } from '../../pdf/operators.ts';
import { TextPen } from '../../pdf/text-pen.ts';
import { drawLines, LinesOwner } from '../../text/draw-lines.ts';
import { noticeBlock } from '../notice.ts';
import { CLAIM, CLAIM_WHY, INK, INK_LINE, RULE, HAIR_LINE, textStyle } from '../print-style.ts';
import type { BlockHandler, RenderContext } from '../render-context.ts';
import { layOutLines } from '../text-block.ts';
import { symbolWords } from '../symbol-words.ts';
import { verdictColour, verdictOperators } from '../verdict-mark.ts';

const SPACE_ABOVE = 11;
const SPACE_BELOW = 10;
const PAD = 6;
const WHY_GAP = 2;
const ICON = 13.5;
const ICON_GAP = 4.5;
const VERDICT_SIZE = 10.5;
const GAP = 18;

/** A claim between two rules with its verdict, and the line that says by what measure. It does not break. */
export const claim: BlockHandler<ClaimNode> = (node, context) => {
  const view = claimLine(node.attrs.claim, context.evidence, context.findings);
  if (!view) {
    noticeBlock('A claim stood here that is no longer in the evidence.', context);
    return;
  }
  const { writer, flow, left, width } = context;
  const verdict = shapeText('uiBold', view.verdict);
  const verdictWidth = verdict.width * VERDICT_SIZE + ICON + ICON_GAP;
  const run = (text: string, face: typeof CLAIM) => [{ kind: 'text', text, style: textStyle(face) }] as const;
  const sentence = layOutLines(
    run(`Claim ${view.n}. ${view.text}`, CLAIM),
    CLAIM,
    width - verdictWidth - GAP,
  );
  const why = view.why === '' ? null : layOutLines(symbolWords(view.why, CLAIM_WHY), CLAIM_WHY, width);
  const height = PAD + sentence.height + (why ? WHY_GAP + why.height : 0) + PAD;
  flow.begin(SPACE_ABOVE, height);
  const top = flow.y;
  rule(context, top, INK, INK_LINE);
  const block = writer.element('Sect');
  context.element.add(block);
  const paragraph = (lines: typeof sentence.lines, y: number) => {
    const element = writer.element('P');
    block.add(element);
    drawLines(writer, lines, { x: left, y, owner: new LinesOwner(writer, element, 'P') });
  };
  paragraph(sentence.lines, top + PAD);
  const mark = writer.element('P');
  block.add(mark);
  const x = left + width - verdictWidth;
  const baseline = top + PAD + (sentence.lines[0]?.ascent ?? CLAIM.leading);
  writer.artifact('Layout', () =>
    writer.write(verdictOperators(view.verdict, x, baseline - ICON * 0.82, ICON)),
  );
  writer.content(mark, 'P', () => {
    const pen = new TextPen(writer);
    pen.text(verdict, VERDICT_SIZE, x + ICON + ICON_GAP, baseline, verdictColour(view.verdict));
    pen.end();
  });
  if (why) paragraph(why.lines, top + PAD + sentence.height + WHY_GAP);
  flow.y = top + height;
  rule(context, flow.y, RULE, HAIR_LINE);
  flow.y += SPACE_BELOW;
};

function rule({ writer, left, width }: RenderContext, y: number, colour: string, strength: number): void {
  writer.artifact('Layout', () => {
    const rectangle = `${length(left)} ${length(y - strength / 2)} ${length(width)} ${strength} re f`;
    writer.write(`${fillColour(colour)} ${rectangle}`);
  });
}
