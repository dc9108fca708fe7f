/** Prints the demonstration's report in a process of its own and says the fingerprint of the file. */
import { createHash } from 'node:crypto';
import { renderReportPdf } from '#server/rendering/report-pdf.ts';
import { demoInput } from './demo-input.ts';

const { bytes } = await renderReportPdf(demoInput());
process.stdout.write(createHash('sha256').update(bytes).digest('hex'));
