/** A finished PDF and the name it is saved under. */
export interface PdfFile {
  readonly name: string;
  readonly bytes: Uint8Array;
}

/** "leaning-spout-report.pdf", from the problem's title and what of it is printed. */
export function pdfFileName(title: string, what: string): string {
  const name = title
    .normalize('NFKD')
    .toLowerCase()
    .replace(/[^a-z0-9]+/gu, '-')
    .replace(/^-|-$/gu, '');
  return `${name || 'problem'}-${what}.pdf`;
}
