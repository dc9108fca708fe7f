/**
 * The part of pdfkit 0.20.2 that the PDF uses. It reaches below pdfkit's public interface for fonts, graphics states
 * and raw operators; the version is pinned and tests/server/rendering guards what is relied on.
 */
import type { Font } from 'fontkit';
import PDFDocument from 'pdfkit';

export interface Reference {
  readonly data: Record<string, unknown>;
  end(content?: string | Uint8Array): void;
}

export interface EmbeddedFont {
  readonly id: string;
  /** Thousandths of an em for each unit of the font. */
  readonly scale: number;
  readonly subset: { includeGlyph(id: number): number };
  readonly widths: number[];
  readonly unicode: (readonly number[])[];
  ref(): Reference;
}

export interface StructureElement {
  add(child: unknown): StructureElement;
  end(): void;
}

export interface StructureOptions {
  readonly title?: string;
  readonly lang?: string;
  readonly alt?: string;
  readonly expanded?: string;
  readonly actual?: string;
  readonly scope?: 'Column' | 'Row' | 'Both';
  readonly placement?: 'Block' | 'Inline';
  readonly bbox?: readonly number[];
}

export interface OutlineItem {
  addItem(title: string, options?: Record<string, unknown>): OutlineItem;
}

export interface Page {
  readonly width: number;
  readonly height: number;
  readonly fonts: Record<string, Reference>;
  readonly ext_gstates: Record<string, Reference>;
  readonly xobjects: Record<string, Reference>;
}

export interface Picture {
  readonly width: number;
  readonly height: number;
}

/** A document being written. */
export interface PdfDocument {
  readonly page: Page;
  readonly outline: OutlineItem;
  readonly info: Record<string, unknown>;
  readonly _font: EmbeddedFont;
  _addInfo(): void;
  on(event: 'data', listener: (chunk: Uint8Array) => void): this;
  on(event: 'end', listener: () => void): this;
  on(event: 'error', listener: (error: Error) => void): this;
  addPage(): this;
  font(font: Font): this;
  addContent(operators: string): this;
  ref(data: Record<string, unknown>): Reference;
  struct(type: string, options?: StructureOptions): StructureElement;
  addStructure(element: StructureElement): this;
  markStructureContent(tag: string, options?: Record<string, unknown>): unknown;
  markContent(tag: string, options?: Record<string, unknown>): this;
  endMarkedContent(): this;
  bufferedPageRange(): { readonly start: number; readonly count: number };
  switchToPage(index: number): unknown;
  openImage(bytes: Uint8Array): Picture;
  image(
    picture: Picture,
    x: number,
    y: number,
    options: { readonly width: number; readonly height: number },
  ): this;
  link(
    x: number,
    y: number,
    width: number,
    height: number,
    url: string,
    options?: Record<string, unknown>,
  ): this;
  end(): void;
}

type PdfDocumentConstructor = new (options: Record<string, unknown>) => PdfDocument;

export function createPdfDocument(options: Record<string, unknown>): PdfDocument {
  const Constructor = PDFDocument as unknown as PdfDocumentConstructor;
  return new Constructor(options);
}
