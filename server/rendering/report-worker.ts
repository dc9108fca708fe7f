/** Runs in a thread of the pool: prints one report and tells how far it has come. */
import type { MessagePort } from 'node:worker_threads';
import { renderReportPdf, type ReportPdf, type ReportPdfInput } from './report-pdf.ts';

export interface RenderTask {
  readonly input: ReportPdfInput;
  readonly port: MessagePort;
}

/** One message of the port. */
export interface RenderProgress {
  readonly share: number;
  readonly at: string;
}

export async function renderInWorker({ input, port }: RenderTask): Promise<ReportPdf> {
  const report = (share: number, at: string) => {
    const message: RenderProgress = { share, at };
    port.postMessage(message);
  };
  try {
    return await renderReportPdf(input, report);
  } finally {
    port.close();
  }
}
