import type { Glyph } from 'fontkit';
import type { Face } from '../fonts/load-face.ts';
import type { ShapedText } from '../fonts/shape-text.ts';
import { fillColour, length } from './operators.ts';
import type { PdfWriter } from './pdf-writer.ts';

/** A kern below this many points is left to the viewer's own rounding. */
const LEAST_KERN = 0.004;
/** A jump of more than this many ems begins a new position instead of a kern. */
const LONGEST_KERN = 2;

interface PlacedGlyphs {
  readonly face: Face;
  readonly size: number;
  readonly x: number;
  readonly y: number;
  readonly colour: string;
  readonly glyphs: readonly Glyph[];
  /** Advances in points; null: the face's own. */
  readonly advances: readonly number[] | null;
}

/**
 * Writes text, joining glyphs of one face, size, colour and baseline into one operator. Coordinates are the page's:
 * points from the upper left corner, y down. Nothing is on the page before end().
 */
export class TextPen {
  private lines: string[] = [];
  private open: { key: string; array: string; x: number } | null = null;
  private fontSet = '';
  private colourSet = '';

  constructor(private readonly writer: PdfWriter) {}

  text(shaped: ShapedText, size: number, x: number, y: number, colour: string): void {
    for (const run of shaped.runs) {
      this.glyphs({
        face: run.face,
        size: size * run.scale,
        x: x + run.x * size,
        y: y - run.rise * size,
        colour,
        glyphs: run.glyphs,
        advances: run.advances.map((advance) => advance * size),
      });
    }
  }

  glyphs({ face, size, x, y, colour, glyphs, advances }: PlacedGlyphs): void {
    if (glyphs.length === 0) return;
    const font = this.writer.font(face);
    const key = `${font.id} ${length(size)} ${length(y)} ${colour}`;
    if (!this.open || this.open.key !== key || Math.abs(x - this.open.x) > LONGEST_KERN * size) {
      this.begin(font.id, size, x, y, colour, key);
    }
    const open = this.open;
    if (!open) return;
    this.kern(open, x - open.x, size);
    glyphs.forEach((glyph, i) => {
      open.array += font.code(glyph);
      const own = (font.advance(glyph) * size) / 1000;
      open.x += own;
      const wanted = advances?.[i] ?? own;
      if (i < glyphs.length - 1) this.kern(open, wanted - own, size);
    });
  }

  private kern(open: { array: string; x: number }, by: number, size: number): void {
    if (Math.abs(by) <= LEAST_KERN) return;
    open.array += `>${length((-by / size) * 1000)}<`;
    open.x += by;
  }

  private begin(id: string, size: number, x: number, y: number, colour: string, key: string): void {
    this.closeArray();
    const fontSet = `/${id} ${length(size)} Tf`;
    if (fontSet !== this.fontSet) this.lines.push(fontSet);
    this.fontSet = fontSet;
    if (colour !== this.colourSet) this.lines.push(fillColour(colour));
    this.colourSet = colour;
    this.lines.push(`1 0 0 -1 ${length(x)} ${length(y)} Tm`);
    this.open = { key, array: '[<', x };
  }

  private closeArray(): void {
    if (this.open) this.lines.push(`${this.open.array}>] TJ`);
    this.open = null;
  }

  /** Puts everything on the page. The pen can go on writing afterwards. */
  end(): void {
    this.closeArray();
    if (this.lines.length > 0) this.writer.write(`BT\n${this.lines.join('\n')}\nET`);
    this.lines = [];
    this.fontSet = '';
    this.colourSet = '';
  }
}
