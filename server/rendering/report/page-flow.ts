import type { PdfWriter } from '../pdf/pdf-writer.ts';
import { drawLines, type LinesOwner, type LinesPlace } from '../text/draw-lines.ts';
import type { TextLine } from '../text/layout-paragraph.ts';

/** The part of each page that text may fill, in points. */
export interface Frame {
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
}

interface Kept {
  readonly space: number;
  readonly height: number;
  readonly draw: (y: number) => void;
}

/** Fewest lines of a paragraph that may stand alone at a page's end or beginning. */
const FEWEST_LINES = 2;

/** Puts blocks below one another and begins pages; headings wait until what follows them has its place. */
export class PageFlow {
  y: number;
  private kept: Kept[] = [];

  constructor(
    readonly writer: PdfWriter,
    readonly frame: Frame,
    private readonly firstTop: number,
  ) {
    writer.addPage();
    this.y = firstTop;
  }

  private get isAtTop(): boolean {
    return this.y <= (this.writer.pageCount === 1 ? this.firstTop : this.frame.top);
  }

  private newPage(): void {
    this.writer.addPage();
    this.y = this.frame.top;
  }

  /**
   * Makes room for a block: `height` of it must stand together, with `space` above unless it begins a page.
   * What was kept waits no longer.
   */
  begin(space: number, height: number): void {
    const waiting = this.kept;
    this.kept = [];
    const blocks = [...waiting, { space, height, draw: () => undefined }];
    const needed = blocks.reduce(
      (sum, block, i) => sum + block.height + (i === 0 && this.isAtTop ? 0 : block.space),
      0,
    );
    if (this.y + needed > this.frame.bottom && !this.isAtTop) this.newPage();
    for (const block of blocks) {
      if (!this.isAtTop) this.y += block.space;
      block.draw(this.y);
      if (block !== blocks.at(-1)) this.y += block.height;
    }
  }

  /** Holds a heading back until the next block begins; `draw` is given its top. */
  keepWithNext(space: number, height: number, draw: (y: number) => void): void {
    this.kept.push({ space, height, draw });
  }

  /** Draws what still waits at the end of the text. */
  flush(): void {
    if (this.kept.length > 0) this.begin(0, 0);
  }

  /** A paragraph: broken over pages, but never with a single line left alone. */
  lines(
    lines: readonly TextLine[],
    owner: LinesOwner | null,
    place: Omit<LinesPlace, 'y' | 'owner'>,
    space: number,
  ): void {
    const heightOf = (part: readonly TextLine[]) => part.reduce((sum, line) => sum + line.height, 0);
    const together = lines.length <= FEWEST_LINES + 1 ? lines.length : FEWEST_LINES;
    this.begin(space, heightOf(lines.slice(0, together)));
    let rest = lines;
    while (rest.length > 0) {
      const count = this.linesThatFit(rest);
      const part = rest.slice(0, count);
      this.y = drawLines(this.writer, part, { ...place, y: this.y, owner });
      rest = rest.slice(count);
      if (rest.length > 0) this.newPage();
    }
  }

  private linesThatFit(lines: readonly TextLine[]): number {
    let y = this.y;
    let count = 0;
    for (const line of lines) {
      y += line.height;
      if (y > this.frame.bottom + 0.01) break;
      count += 1;
    }
    const left = lines.length - count;
    if (left > 0 && left < FEWEST_LINES && count > FEWEST_LINES) count -= FEWEST_LINES - left;
    return Math.max(count, 1);
  }
}
