import { useEffect, useState } from 'react';
import {
  cancelExport,
  getExport,
  getExportFile,
  startExport,
  type ExportState,
} from '#shared/contracts/report.ts';
import { addressOf } from '#src/lib/api/address-of.ts';
import { sentenceOf } from '#src/lib/api/api-error.ts';
import { call } from '#src/lib/api/call.ts';
import { Word } from '#src/components/word.tsx';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { say } from '#src/lib/sill-store.ts';

const ASK_EVERY_MS = 250;

/** The report as PDF: drawn by the server, with what it is at, and a way to stop it. */
export function ExportWord() {
  const { address } = useProblem();
  const [job, setJob] = useState<ExportState | null>(null);
  const params = { ...address };

  useEffect(() => {
    if (job?.state !== 'working') return undefined;
    const timer = setTimeout(() => {
      call(getExport, { params: { ...address, export: job.id } }).then(
        (next) => {
          setJob(next.state === 'working' ? next : null);
          if (next.state === 'done') download(addressOf(getExportFile.path, { ...address, export: job.id }));
          if (next.state === 'failed') say(next.sentence ?? 'The PDF could not be drawn. Try again.');
        },
        (error: unknown) => {
          setJob(null);
          say(sentenceOf(error));
        },
      );
    }, ASK_EVERY_MS);
    return () => clearTimeout(timer);
  }, [job, address]);

  async function start(): Promise<void> {
    try {
      const { id } = await call(startExport, { params, body: { kind: 'report.pdf' } });
      setJob({ id, state: 'working', share: 0, at: 'beginning' });
    } catch (error) {
      say(sentenceOf(error));
    }
  }

  async function stop(id: string): Promise<void> {
    setJob(null);
    await call(cancelExport, { params: { ...params, export: id } }).catch(() => undefined);
  }

  if (!job) return <Word onClick={() => void start()}>Download PDF</Word>;
  return (
    <span className="text-xs text-ink-2">
      PDF, {Math.round(job.share * 100)} %, {job.at} <Word onClick={() => void stop(job.id)}>Stop</Word>
    </span>
  );
}

function download(address: string): void {
  const link = document.createElement('a');
  link.href = address;
  link.download = '';
  link.click();
}
