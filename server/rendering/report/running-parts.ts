import { shapeText } from '../fonts/shape-text.ts';
import { fillColour, length } from '../pdf/operators.ts';
import type { PdfWriter } from '../pdf/pdf-writer.ts';
import { TextPen } from '../pdf/text-pen.ts';
import type { Frame } from './page-flow.ts';
import { HAIR_LINE, INK_3, RULE, RUNNING } from './print-style.ts';

export interface RunningFacts {
  readonly title: string;
  readonly team: string;
  /** "Draft, 3 March 2026". */
  readonly foot: string;
}

/** Height of the running head's baseline, and of the foot's above the page's end. */
const HEAD_BASELINE = 57;
const HEAD_RULE = 66;
const FOOT_BASELINE = 40;

/** Heads and feet of all pages, once their number is known. The first page has its title block instead of a head. */
export function drawRunningParts(writer: PdfWriter, frame: Frame, facts: RunningFacts): void {
  for (let page = 0; page < writer.pageCount; page++) {
    writer.turnTo(page);
    writer.artifact('Pagination', () => {
      const foot = writer.size.height - FOOT_BASELINE;
      if (page > 0) {
        writeLine(writer, frame, HEAD_BASELINE, facts.title, facts.team);
        const rule = `${length(frame.left)} ${HEAD_RULE} ${length(frame.right - frame.left)} ${HAIR_LINE} re f`;
        writer.write(`${fillColour(RULE)} ${rule}`);
      }
      writeLine(writer, frame, foot, facts.foot, String(page + 1));
    });
  }
}

function writeLine(writer: PdfWriter, frame: Frame, y: number, left: string, right: string): void {
  const pen = new TextPen(writer);
  const end = shapeText(RUNNING.regular, right);
  pen.text(shapeText(RUNNING.regular, left), RUNNING.size, frame.left, y, INK_3);
  pen.text(end, RUNNING.size, frame.right - end.width * RUNNING.size, y, INK_3);
  pen.end();
}
