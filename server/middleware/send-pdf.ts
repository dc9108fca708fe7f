import type { Response } from 'express';
import type { PdfFile } from '#server/rendering/pdf-file.ts';

/** Answers with a PDF, to be saved under its name, or shown in the browser, which saves it under its name. */
export function sendPdf(
  response: Response,
  file: PdfFile,
  how: 'attachment' | 'inline' = 'attachment',
): void {
  response.setHeader('content-type', 'application/pdf');
  response.setHeader('content-disposition', `${how}; filename="${file.name}"`);
  response.setHeader('x-content-type-options', 'nosniff');
  response.status(200).end(Buffer.from(file.bytes));
}
