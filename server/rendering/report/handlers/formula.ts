import { equationSteps, type EquationSteps } from '#shared/report/formula-steps.ts';
import type { FormulaNode } from '#shared/report/schema/report-node.ts';
import { shapeText } from '../../fonts/shape-text.ts';
import { drawFormulaPart } from '../../formulas/draw-formula.ts';
import { layOutFormula, type FormulaPart } from '../../formulas/formula-layout.ts';
import { TextPen } from '../../pdf/text-pen.ts';
import { formulaWords } from '../formula-words.ts';
import { noticeBlock } from '../notice.ts';
import { BODY, FORMULA_SCALE, INK, INK_2, PUT_IN_COLOURS } from '../print-style.ts';
import type { BlockHandler, RenderContext } from '../render-context.ts';

const SPACE_ABOVE = 9;
const SPACE_BELOW = 6;
const SPACE_BETWEEN = 7;
/** Room at both sides, so that a centred formula stays clear of its number. */
const NUMBER_ROOM = 34;
const SMALLEST = 0.82;

interface FormulaLine {
  readonly parts: readonly FormulaPart[];
  readonly width: number;
  readonly height: number;
  readonly depth: number;
}

/** A formula on its own line: typed, or an equation with its numbers put in on the next line. */
export const formula: BlockHandler<FormulaNode> = (node, context) => {
  const { attrs } = node;
  if (attrs.kind === 'typed') {
    if (attrs.latex.trim() === '') return;
    drawFormula([attrs.latex], formulaWords(attrs.latex), node, context);
    return;
  }
  const steps = stepsOf(node, context);
  if (!steps) return;
  if (steps.ok) {
    const lines = steps.numbers === null ? [steps.symbols] : [steps.symbols, steps.numbers];
    drawFormula(lines, steps.spoken, node, context);
    return;
  }
  if (steps.symbols !== null) drawFormula([steps.symbols], formulaWords(steps.symbols), node, context);
  noticeBlock(steps.fault.sentence, context);
};

function stepsOf({ attrs }: FormulaNode, context: RenderContext): EquationSteps | null {
  const { model, defines, series, at, steps } = attrs;
  if (model === null || defines === null) return null;
  return equationSteps({ model, defines, series, at }, steps, context.evidence, context.findings);
}

function drawFormula(latex: readonly string[], alt: string, node: FormulaNode, context: RenderContext): void {
  const { writer, flow, left, width } = context;
  const room = width - 2 * NUMBER_ROOM;
  const laid = latex.map((text) => layOutFormula(text, true, PUT_IN_COLOURS));
  const failed = laid.findIndex((layout) => !layout.ok);
  if (failed >= 0) {
    noticeBlock(`This formula cannot be read: ${latex[failed] ?? ''}`, context);
    return;
  }
  const widest = Math.max(...laid.map((layout) => (layout.ok ? layout.width : 0)));
  const full = BODY.size * FORMULA_SCALE;
  const size = Math.max(full * SMALLEST, Math.min(full, room / widest));
  const lines = laid.flatMap((layout) => (layout.ok ? breakFormula(layout.parts, room / size) : []));
  const heights = lines.map((line) => Math.max((line.height + line.depth) * size, BODY.leading));
  const total = heights.reduce((sum, height) => sum + height + SPACE_BETWEEN, -SPACE_BETWEEN);
  flow.begin(SPACE_ABOVE, total);
  const element = writer.element('Formula', {
    alt,
    placement: 'Block',
    bbox: [left, flow.y, left + width, flow.y + total],
  });
  context.element.add(element);
  writer.content(element, 'Formula', () => {
    const pen = new TextPen(writer);
    let y = flow.y;
    lines.forEach((line, i) => {
      const height = heights[i] ?? 0;
      const baseline = y + (height - (line.height + line.depth) * size) / 2 + line.height * size;
      let x = left + (width - line.width * size) / 2;
      for (const part of line.parts) {
        drawFormulaPart(writer, pen, part, { x, y: baseline, size, colour: INK });
        x += part.width * size;
      }
      if (i === 0) drawNumber(pen, node, baseline, context);
      y += height + SPACE_BETWEEN;
    });
    pen.end();
  });
  flow.y += total + SPACE_BELOW;
}

function drawNumber(pen: TextPen, node: FormulaNode, baseline: number, context: RenderContext): void {
  const number = context.numbers.formulas.get(node.attrs.anchor);
  if (number === undefined) return;
  const shaped = shapeText('body', `(${number})`);
  const x = context.left + context.width - shaped.width * BODY.size;
  pen.text(shaped, BODY.size, x, baseline, INK_2);
}

/** Fills lines with the formula's parts; a part wider than the line stands alone. */
function breakFormula(parts: readonly FormulaPart[], room: number): FormulaLine[] {
  const lines: FormulaPart[][] = [[]];
  let width = 0;
  for (const part of parts) {
    const last = lines.at(-1) ?? [];
    if (last.length > 0 && width + part.width > room + 0.01) {
      lines.push([part]);
      width = part.width;
    } else {
      last.push(part);
      width += part.width;
    }
  }
  return lines.map((line) => ({
    parts: line,
    width: line.reduce((sum, part) => sum + part.width, 0),
    height: Math.max(0, ...line.map((part) => part.height)),
    depth: Math.max(0, ...line.map((part) => part.depth)),
  }));
}
