import { symbolToLatex } from '#shared/formatting/symbol.ts';
import { showValue } from '#shared/report/live-value.ts';
import type { InlineNode, LiveValueNode, ReportMark, TextNode } from '#shared/report/schema/report-node.ts';
import type { FontStack } from '../fonts/font-stacks.ts';
import { layOutFormula } from '../formulas/formula-layout.ts';
import type { FormulaRun, InlineRun, TextRun } from '../text/inline-run.ts';
import { formulaWords } from './formula-words.ts';
import { FORMULA_SCALE, hueColour, INK_2, INK_3, LEAK, LETTER, PUT_IN_COLOURS, textStyle, type TextFace } from './print-style.ts'; // prettier-ignore
import type { RenderContext } from './render-context.ts';
import { splitUntied } from './split-untied.ts';

type InlineContext = Pick<RenderContext, 'evidence' | 'findings' | 'sources' | 'settings'>;

/** The runs of a sentence. */
export function inlineRuns(
  nodes: readonly InlineNode[] | undefined,
  face: TextFace,
  context: InlineContext,
): InlineRun[] {
  return (nodes ?? []).flatMap((node): InlineRun[] => {
    switch (node.type) {
      case 'text':
        return textRuns(node, face, context);
      case 'hardBreak':
        return [{ kind: 'break' }];
      case 'liveValue':
        return liveValueRuns(node, face, context);
      case 'inlineFormula':
        return formulaRuns(node.attrs.latex, face, face.colour);
    }
  });
}

function stackFor(face: TextFace, marks: readonly ReportMark[] = []): FontStack {
  const isBold = marks.some((mark) => mark.type === 'bold');
  const isItalic = marks.some((mark) => mark.type === 'italic');
  if (isBold) return isItalic ? face.boldItalic : face.bold;
  return isItalic ? face.italic : face.regular;
}

function textRuns(node: TextNode, face: TextFace, context: InlineContext): TextRun[] {
  const style = textStyle(face, stackFor(face, node.marks));
  const link = node.marks?.find((mark) => mark.type === 'link');
  if (link) {
    const element = { tag: 'Link', href: link.attrs.href } as const;
    return [{ kind: 'text', text: node.text, style, element, underline: INK_3 }];
  }
  return splitUntied(node.text, context.settings).map(({ text, isUntied }): TextRun =>
    isUntied ? { kind: 'text', text, style, whole: true, dashed: LEAK } : { kind: 'text', text, style },
  );
}

/** A typed formula; one that cannot be read is printed as it was typed, in the dashed box of what is not finished. */
export function formulaRuns(latex: string, face: TextFace, colour: string): InlineRun[] {
  if (latex.trim() === '') return [];
  const layout = layOutFormula(latex, false, PUT_IN_COLOURS);
  if (!layout.ok) {
    const style = textStyle(face, face.italic);
    return [{ kind: 'text', text: latex, style, whole: true, dashed: LEAK }];
  }
  const run: FormulaRun = {
    kind: 'formula',
    parts: layout.parts,
    size: face.size * FORMULA_SCALE,
    colour,
    element: { tag: 'Formula', alt: formulaWords(latex) },
  };
  return [run];
}

/** A tied number in its hue with its letter; one whose source is gone keeps its last words in a dashed box. */
function liveValueRuns(node: LiveValueNode, face: TextFace, context: InlineContext): InlineRun[] {
  const { ref, form, unit, shown: lastShown } = node.attrs;
  const { evidence, findings, sources } = context;
  const shown = showValue(ref, form, unit, evidence, findings);
  const stack = stackFor(face, node.marks);
  if (shown.state === 'fault') {
    const style = textStyle(face, stack, LEAK);
    return [{ kind: 'text', text: lastShown ?? shown.text, style, whole: true, dashed: LEAK }];
  }
  const colour = hueColour(shown.hue);
  const style = textStyle(face, stack, colour);
  const symbol = shown.symbol === null ? [] : formulaRuns(symbolToLatex(shown.symbol), face, colour);
  const equals = shown.symbol === null ? '' : '\u00a0=\u00a0';
  const value: TextRun = { kind: 'text', text: `${equals}${shown.value}`, style, whole: true };
  return [...symbol, value, letterRun(sources.letter(ref), face)];
}

/** The small raised letter that leads to the list at the end. */
function letterRun(letter: string, face: TextFace): TextRun {
  return {
    kind: 'text',
    text: `\u200a${letter}`,
    style: {
      stack: 'uiMedium',
      size: face.size * LETTER.scale,
      colour: INK_2,
      rise: face.size * LETTER.rise,
    },
    whole: true,
    element: { tag: 'Reference' },
  };
}
