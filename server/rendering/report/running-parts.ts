import { sealFigures } from '#shared/editions/seal.ts';
import { shapeText } from '../fonts/shape-text.ts';
import { fillColour, length } from '../pdf/operators.ts';
import type { PdfWriter } from '../pdf/pdf-writer.ts';
import { TextPen } from '../pdf/text-pen.ts';
import type { Frame } from './page-flow.ts';
import { drawSeal } from './print-seal.ts';
import { HAIR_LINE, INK_3, RULE, RUNNING } from './print-style.ts';

export interface RunningFacts {
  readonly title: string;
  readonly team: string;
  /** "Draft, 3 March 2026". */
  readonly foot: string;
  /** Its seal stands in the foot, drawn and in figures; null: a draft has none. */
  readonly edition: { readonly n: number; readonly seal: string } | null;
}

/** Height of the running head's baseline, and of the foot's above the page's end. */
const HEAD_BASELINE = 57;
const HEAD_RULE = 66;
const FOOT_BASELINE = 40;
/** Side of the seal, its upper edge above the page's end, and the gap to the words beside it. */
const SEAL = { side: 34.5, top: 56, gap: 11 } as const;

/** Heads and feet of all pages, once their number is known. The first page has its title block instead of a head. */
export function drawRunningParts(writer: PdfWriter, frame: Frame, facts: RunningFacts): void {
  for (let page = 0; page < writer.pageCount; page++) {
    writer.turnTo(page);
    writer.artifact('Pagination', () => {
      if (page > 0) {
        writeLine(writer, frame, HEAD_BASELINE, facts.title, facts.team);
        const rule = `${length(frame.left)} ${HEAD_RULE} ${length(frame.right - frame.left)} ${HAIR_LINE} re f`;
        writer.write(`${fillColour(RULE)} ${rule}`);
      }
      drawFoot(writer, frame, facts, String(page + 1));
    });
  }
}

function drawFoot(writer: PdfWriter, frame: Frame, { foot, edition }: RunningFacts, page: string): void {
  const baseline = writer.size.height - FOOT_BASELINE;
  if (edition === null) {
    writeLine(writer, frame, baseline, foot, page);
    return;
  }
  const { side, top, gap } = SEAL;
  drawSeal(writer, edition, { x: frame.left, y: writer.size.height - top, side });
  const beside = { ...frame, left: frame.left + side + gap };
  writeLine(writer, beside, baseline - 2, foot, page);
  writeLine(writer, beside, baseline - 2 + RUNNING.leading, `seal ${sealFigures(edition.seal)}`, '');
}

function writeLine(writer: PdfWriter, frame: Frame, y: number, left: string, right: string): void {
  const pen = new TextPen(writer);
  const end = shapeText(RUNNING.regular, right);
  pen.text(shapeText(RUNNING.regular, left), RUNNING.size, frame.left, y, INK_3);
  pen.text(end, RUNNING.size, frame.right - end.width * RUNNING.size, y, INK_3);
  pen.end();
}
