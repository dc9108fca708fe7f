import type { ExportState } from '#shared/contracts/report.ts';

/** A file being made, or made. Kept in memory only: it can be made again at any time. */
export interface ExportJob {
  readonly id: string;
  readonly problemId: string;
  readonly userId: string;
  readonly abort: AbortController;
  state: ExportState['state'];
  share: number;
  at: string;
  sentence?: string | undefined;
  file: { readonly name: string; readonly bytes: Uint8Array } | null;
}

/** How many jobs are remembered; the oldest that are over go first. */
const MOST_REMEMBERED = 40;

/** The exports of this process, each seen only by who started it. */
export class ExportJobs {
  private readonly jobs = new Map<string, ExportJob>();

  add(job: ExportJob): void {
    this.jobs.set(job.id, job);
    for (const [id, old] of this.jobs) {
      if (this.jobs.size <= MOST_REMEMBERED) break;
      if (old.state !== 'working') this.jobs.delete(id);
    }
  }

  find(id: string, problemId: string, userId: string): ExportJob | null {
    const job = this.jobs.get(id);
    return job && job.problemId === problemId && job.userId === userId ? job : null;
  }

  countWorking(userId: string): number {
    return [...this.jobs.values()].filter((job) => job.userId === userId && job.state === 'working').length;
  }
}

export function toExportState(job: ExportJob): ExportState {
  const { id, state, share, at, sentence } = job;
  return { id, state, share, at, ...(sentence === undefined ? {} : { sentence }) };
}
