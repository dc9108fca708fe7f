import { shapeText } from '../fonts/shape-text.ts';
import { factor, length } from '../pdf/operators.ts';
import type { PdfWriter } from '../pdf/pdf-writer.ts';
import { TextPen } from '../pdf/text-pen.ts';
import { INK, RUNNING } from './print-style.ts';

/** To whom a copy was lent, and its number. */
export interface LentTo {
  readonly recipient: string;
  readonly number: number;
}

const LARGEST = 34;
/** Share of the page's diagonal that the words may take. */
const REACH = 0.78;
const STRENGTH = 0.11;
/** Heights of the lines, as shares of the page. */
const LINES = [0.24, 0.52, 0.8] as const;

/** "Lent to Gannet Bank, copy 3". */
export function lentWords({ recipient, number }: LentTo): string {
  return `Lent to ${recipient}, copy ${number}`;
}

/** Writes the recipient and the number of the copy across every page, faint enough to read through. */
export function drawWatermark(writer: PdfWriter, lentTo: LentTo): void {
  const words = shapeText(RUNNING.regular, lentWords(lentTo));
  const { width, height } = writer.size;
  const size = Math.min(LARGEST, (REACH * Math.hypot(width, height)) / 2 / words.width);
  const angle = Math.atan2(height / 3, width);
  const [cos, sin] = [factor(Math.cos(angle)), factor(Math.sin(angle))];
  for (let page = 0; page < writer.pageCount; page++) {
    writer.turnTo(page);
    writer.artifact('Pagination', () => {
      for (const line of LINES) {
        writer.write(`q /${writer.opacity(STRENGTH, STRENGTH)} gs`);
        writer.write(`${cos} -${sin} ${sin} ${cos} ${length(width / 2)} ${length(height * line)} cm`);
        const pen = new TextPen(writer);
        pen.text(words, size, (-words.width * size) / 2, 0, INK);
        pen.end();
        writer.write('Q');
      }
    });
  }
}
