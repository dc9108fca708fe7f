/** Files made from a problem: the report as PDF. Everybody of the team may make them; each sees only their own. */
import { randomUUID } from 'node:crypto';
import type { ExportState } from '#shared/contracts/report.ts';
import { AppError } from '#server/errors/app-error.ts';
import { notFound } from '#server/errors/refusals.ts';
import type { ServerDeps } from '#server/deps.ts';
import type { ProblemPlace } from '#server/features/teams/service.ts';
import type { Actor } from '#server/middleware/actor.ts';
import { pdfFileName, type PdfFile } from '#server/rendering/pdf-file.ts';
import { toExportState, type ExportJob, type ExportJobs } from './export-jobs.ts';
import { gatherReport } from './gather-report.ts';

const MOST_AT_ONCE = 2;

/** Prints the report as it stands now. */
export async function printReport(
  deps: ServerDeps,
  place: ProblemPlace,
  options: { signal?: AbortSignal; onProgress?: (share: number, at: string) => void } = {},
): Promise<PdfFile> {
  const input = await gatherReport(deps, place);
  const { bytes } = await deps.renderer.render(input, options);
  return { name: pdfFileName(input.problem.title, 'report'), bytes };
}

/** Starts an export and answers at once; 429 `too-many-exports` while two of the same person are under way. */
export function startExport(
  deps: ServerDeps,
  jobs: ExportJobs,
  place: ProblemPlace,
  actor: Actor,
): { id: string } {
  if (jobs.countWorking(actor.id) >= MOST_AT_ONCE) {
    throw new AppError(
      429,
      'too-many-exports',
      'Two files are being made for you already. Wait until one of them is done.',
    );
  }
  const job: ExportJob = {
    id: randomUUID(),
    problemId: place.problem.id,
    userId: actor.id,
    abort: new AbortController(),
    state: 'working',
    share: 0,
    at: 'Reading the report',
    file: null,
  };
  jobs.add(job);
  void work(deps, job, place);
  return { id: job.id };
}

async function work(deps: ServerDeps, job: ExportJob, place: ProblemPlace): Promise<void> {
  try {
    const file = await printReport(deps, place, {
      signal: job.abort.signal,
      onProgress: (share, at) => {
        if (job.state === 'working') Object.assign(job, { share, at });
      },
    });
    if (job.state === 'working') Object.assign(job, { state: 'done', share: 1, at: 'Done', file });
  } catch (error) {
    if (job.state !== 'working') return;
    deps.logger.error({ err: error, export: job.id }, 'export failed');
    job.state = 'failed';
    job.sentence =
      error instanceof AppError
        ? error.message
        : 'The PDF could not be made. Try again; if it fails again, say so to who runs this server.';
  }
}

function getJob(jobs: ExportJobs, place: ProblemPlace, actor: Actor, id: string): ExportJob {
  const job = jobs.find(id, place.problem.id, actor.id);
  if (!job) throw notFound('This export is not kept any more. Start it again.');
  return job;
}

export function getExportState(jobs: ExportJobs, place: ProblemPlace, actor: Actor, id: string): ExportState {
  return toExportState(getJob(jobs, place, actor, id));
}

/** Stops an export that is under way, and forgets the file of one that is done. */
export function cancelExport(jobs: ExportJobs, place: ProblemPlace, actor: Actor, id: string): void {
  const job = getJob(jobs, place, actor, id);
  if (job.state === 'failed') return;
  job.state = 'cancelled';
  job.file = null;
  job.abort.abort();
}

/** The file of a finished export; 409 `not-done` before that. */
export function getExportFile(jobs: ExportJobs, place: ProblemPlace, actor: Actor, id: string): PdfFile {
  const job = getJob(jobs, place, actor, id);
  if (job.file) return job.file;
  if (job.state === 'working') {
    throw new AppError(409, 'not-done', 'The file is still being made. Ask again in a moment.');
  }
  throw new AppError(409, 'not-done', job.sentence ?? 'This export was stopped. Start it again.');
}
