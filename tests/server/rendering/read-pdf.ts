/** Reads a PDF back: its words by pdf.js, its operators by undoing the compression of its streams. */
import { inflateSync } from 'node:zlib';
import { getDocument, type PDFDocumentProxy } from 'pdfjs-dist/legacy/build/pdf.mjs';

export interface StructureNode {
  readonly role: string;
  readonly alt?: string;
  readonly children: readonly StructureNode[];
}

export interface ReadPdf {
  /** Words of each page in the order in which they are written. */
  readonly pages: readonly string[];
  readonly text: string;
  readonly outline: readonly string[];
  readonly structure: readonly StructureNode[];
  readonly title: string;
  readonly lang: string;
  readonly size: readonly [number, number];
}

export async function readPdf(bytes: Uint8Array): Promise<ReadPdf> {
  const task = getDocument({ data: Uint8Array.from(bytes), useSystemFonts: false, verbosity: 0 });
  const document = await task.promise;
  const numbers = Array.from({ length: document.numPages }, (_, i) => i + 1);
  const pages = await Promise.all(numbers.map((number) => pageText(document, number)));
  const trees = await Promise.all(
    numbers.map(async (number) => (await document.getPage(number)).getStructTree()),
  );
  const { info } = await document.getMetadata();
  const [x0 = 0, y0 = 0, x1 = 0, y1 = 0] = (await document.getPage(1)).view;
  const outline = (await document.getOutline()) ?? [];
  const read: ReadPdf = {
    pages,
    text: pages.join(' '),
    outline: outline.flatMap((item) => [
      item.title,
      ...item.items.map((inner: { title: string }) => inner.title),
    ]),
    structure: trees.map((tree) => toNode(tree)),
    title: String((info as { Title?: string }).Title ?? ''),
    lang: String((info as { Language?: string }).Language ?? ''),
    size: [x1 - x0, y1 - y0],
  };
  await task.destroy();
  return read;
}

async function pageText(document: PDFDocumentProxy, number: number): Promise<string> {
  const { items } = await (await document.getPage(number)).getTextContent();
  return items
    .map((item) => ('str' in item ? item.str + (item.hasEOL ? ' ' : '') : ''))
    .join('')
    .replaceAll(/\s+/gu, ' ');
}

function toNode(raw: unknown): StructureNode {
  const node = raw as { role?: string; alt?: string; children?: unknown[] } | null;
  const children = (node?.children ?? []).filter((child) => (child as { role?: string }).role !== undefined);
  return {
    role: node?.role ?? '',
    ...(node?.alt === undefined ? {} : { alt: node.alt }),
    children: children.map(toNode),
  };
}

/** Every element of a kind, in reading order. */
export function elementsOf(nodes: readonly StructureNode[], role: string): StructureNode[] {
  return nodes.flatMap((node) => [...(node.role === role ? [node] : []), ...elementsOf(node.children, role)]);
}

/** Operators of the pages' contents, line by line. */
export function contentLines(bytes: Uint8Array): string[] {
  const file = Buffer.from(bytes);
  const lines: string[] = [];
  let from = 0;
  for (;;) {
    const start = file.indexOf('stream\n', from);
    if (start < 0) return lines;
    const end = file.indexOf('endstream', start);
    const content = inflated(file.subarray(start + 'stream\n'.length, end));
    if (/\b(?:BDC|BMC)\b/u.test(content)) lines.push(...content.split('\n'));
    from = end + 'endstream'.length;
  }
}

function inflated(stream: Buffer): string {
  try {
    return inflateSync(stream).toString('latin1');
  } catch {
    return '';
  }
}

const PAINTS = /(?:^|\s)(?:TJ|Tj|f|f\*|S|s|B|Do|re f|sh)$/u;

/** Lines that paint, and those among them that stand outside of all marked content. */
export function paintedLines(bytes: Uint8Array): { painted: number; untagged: string[] } {
  let depth = 0;
  let painted = 0;
  const untagged: string[] = [];
  for (const line of contentLines(bytes)) {
    if (/\b(?:BDC|BMC)$/u.test(line)) depth += 1;
    else if (/\bEMC$/u.test(line)) depth -= 1;
    else if (PAINTS.test(line.replace(/ Q$/u, ''))) {
      painted += 1;
      if (depth === 0) untagged.push(line);
    }
  }
  return { painted, untagged };
}
