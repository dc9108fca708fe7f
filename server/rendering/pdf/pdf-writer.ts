import type { Glyph } from 'fontkit';
import { loadFace, type Face } from '../fonts/load-face.ts';
import {
  createPdfDocument,
  type EmbeddedFont,
  type OutlineItem,
  type PdfDocument,
  type Picture,
  type Reference,
  type StructureElement,
  type StructureOptions,
} from './pdf-document.ts';

/** Sizes of paper in points. */
export const PAPER = { A4: { width: 595.28, height: 841.89 }, Letter: { width: 612, height: 792 } } as const;

export interface PdfOptions {
  readonly paper: keyof typeof PAPER;
  readonly title: string;
  readonly author: string;
  readonly subject: string;
  /** Moment written into the file; nothing else in it depends on when or where it is made. */
  readonly at: Date;
}

/** A face as this document has it: its resource name, and the code of each glyph used so far. */
export interface DocumentFont {
  readonly id: string;
  /** Advance of a glyph in thousandths of the text's size. */
  advance(glyph: Glyph): number;
  /** Four hexadecimal digits; the glyph is embedded from now on. */
  code(glyph: Glyph): string;
}

const PRODUCER = 'Holdwater';

/** A tagged PDF being written: pages of raw operators, and the structure that names their content. */
export class PdfWriter {
  readonly size: { readonly width: number; readonly height: number };
  readonly root: StructureElement;
  readonly outline: OutlineItem;
  private readonly document: PdfDocument;
  private readonly chunks: Uint8Array[] = [];
  private readonly finished: Promise<void>;
  private readonly fonts = new Map<Face, { font: EmbeddedFont; known: DocumentFont }>();
  private readonly graphicsStates = new Map<string, { name: string; reference: Reference }>();
  private readonly forms = new Map<string, { name: string; reference: Reference }>();

  constructor(options: PdfOptions) {
    this.size = PAPER[options.paper];
    this.document = createPdfDocument({
      size: [this.size.width, this.size.height],
      margin: 0,
      autoFirstPage: false,
      bufferPages: true,
      pdfVersion: '1.7',
      tagged: true,
      subset: 'PDF/UA',
      lang: 'en-GB',
      displayTitle: true,
      // A real face from the start; otherwise pdfkit opens one of its own.
      font: loadFace('stix').font,
      info: {
        Title: options.title,
        Author: options.author,
        Subject: options.subject,
        Creator: PRODUCER,
        Producer: PRODUCER,
        CreationDate: options.at,
        ModDate: options.at,
      },
    });
    escapeMetadata(this.document);
    this.document.on('data', (chunk) => this.chunks.push(chunk));
    this.finished = new Promise((resolve, reject) => {
      this.document.on('end', resolve);
      this.document.on('error', reject);
    });
    this.root = this.document.struct('Document');
    this.document.addStructure(this.root);
    this.outline = this.document.outline;
  }

  addPage(): void {
    this.document.addPage();
  }

  get pageCount(): number {
    return this.document.bufferedPageRange().count;
  }

  /** Goes back to a page, from 0, to write on it once more. */
  turnTo(page: number): void {
    this.document.switchToPage(page);
  }

  write(operators: string): void {
    if (operators !== '') this.document.addContent(operators);
  }

  element(type: string, options: StructureOptions = {}): StructureElement {
    return this.document.struct(type, options);
  }

  /** Draws content that belongs to a structure element. A child's content is not drawn inside its parent's. */
  content(element: StructureElement, tag: string, draw: () => void): void {
    element.add(this.document.markStructureContent(tag));
    draw();
    this.document.endMarkedContent();
  }

  /** Draws what a reader of the text does not need: rules, grounds, running heads. */
  artifact(type: 'Layout' | 'Pagination', draw: () => void): void {
    this.document.markContent('Artifact', { type });
    draw();
    this.document.endMarkedContent();
  }

  font(face: Face): DocumentFont {
    const known = this.fonts.get(face);
    const entry = known ?? this.embed(face);
    this.document.page.fonts[entry.font.id] ??= entry.font.ref();
    return entry.known;
  }

  private embed(face: Face): { font: EmbeddedFont; known: DocumentFont } {
    this.document.font(face.font);
    const font = this.document._font;
    const codes = new Map<number, string>();
    const known: DocumentFont = {
      id: font.id,
      advance: (glyph) => glyph.advanceWidth * font.scale,
      code(glyph) {
        const cached = codes.get(glyph.id);
        if (cached !== undefined) return cached;
        const id = font.subset.includeGlyph(glyph.id);
        font.widths[id] ??= glyph.advanceWidth * font.scale;
        font.unicode[id] ??= glyph.codePoints;
        const code = id.toString(16).padStart(4, '0');
        codes.set(glyph.id, code);
        return code;
      },
    };
    const entry = { font, known };
    this.fonts.set(face, entry);
    return entry;
  }

  /** Name of a graphics state with these opacities, for the operator `gs`. */
  opacity(fill: number, stroke: number): string {
    const key = `${fill} ${stroke}`;
    let state = this.graphicsStates.get(key);
    if (!state) {
      const reference = this.document.ref({ Type: 'ExtGState', ca: fill, CA: stroke });
      reference.end();
      state = { name: `Gx${this.graphicsStates.size}`, reference };
      this.graphicsStates.set(key, state);
    }
    this.document.page.ext_gstates[state.name] = state.reference;
    return state.name;
  }

  /** Name of a form with these operators inside a square of ± half, for the operator `Do`; kept by its operators. */
  form(operators: string, half: number): string {
    let form = this.forms.get(operators);
    if (!form) {
      const box = [-half, -half, half, half];
      const reference = this.document.ref({ Type: 'XObject', Subtype: 'Form', BBox: box, Resources: {} });
      reference.end(operators);
      form = { name: `Fx${this.forms.size}`, reference };
      this.forms.set(operators, form);
    }
    this.document.page.xobjects[form.name] = form.reference;
    return form.name;
  }

  openPicture(bytes: Uint8Array): Picture {
    return this.document.openImage(bytes);
  }

  picture(picture: Picture, box: { x: number; y: number; width: number; height: number }): void {
    this.document.image(picture, box.x, box.y, { width: box.width, height: box.height });
  }

  /** Makes a rectangle of the page lead to an address; `words` is what a reader is told. */
  link(
    box: { x: number; y: number; width: number; height: number },
    href: string,
    words: string,
    element: StructureElement,
  ): void {
    // A String object becomes a PDF string; a primitive would become a name.
    const contents = Object(words) as unknown;
    this.document.link(box.x, box.y, box.width, box.height, href, {
      structParent: element,
      Contents: contents,
    });
  }

  /** A bookmark to a height of the present page. */
  bookmark(parent: OutlineItem, words: string, y: number, expanded = false): OutlineItem {
    // pdfkit measures both from the far corner, so the page's width leads to its left edge.
    return parent.addItem(words, { top: y, left: this.size.width, expanded });
  }

  async finish(): Promise<Uint8Array> {
    this.root.end();
    this.document.end();
    await this.finished;
    return Buffer.concat(this.chunks);
  }
}

/** pdfkit copies the information into XML as it stands. */
function escapeMetadata(document: PdfDocument): void {
  const original = document._addInfo.bind(document);
  document._addInfo = () => {
    const kept = { ...document.info };
    for (const [key, value] of Object.entries(kept)) {
      if (typeof value === 'string') document.info[key] = escapeXml(value);
    }
    original();
    Object.assign(document.info, kept);
  };
}

function escapeXml(text: string): string {
  return text.replaceAll('&', '&amp;').replaceAll('<', '&lt;').replaceAll('>', '&gt;');
}
