import type { Express } from 'express';
import {
  cancelExport as cancelExportEndpoint,
  getExport,
  getExportFile as getExportFileEndpoint,
  getReportPdf,
  startExport as startExportEndpoint,
} from '#shared/contracts/report.ts';
import type { ServerDeps } from '#server/deps.ts';
import { mountProblem } from '#server/middleware/mount.ts';
import { sendPdf } from '#server/middleware/send-pdf.ts';
import { ExportJobs } from './export-jobs.ts';
import { cancelExport, getExportFile, getExportState, printReport, startExport } from './service.ts';

export function mountExports(app: Express, deps: ServerDeps): void {
  const jobs = new ExportJobs();

  mountProblem(app, deps.database, startExportEndpoint, 'read', async ({ place, actor }) =>
    startExport(deps, jobs, place, actor),
  );

  mountProblem(app, deps.database, getExport, 'read', async ({ place, actor, param }) =>
    getExportState(jobs, place, actor, param('export')),
  );

  mountProblem(app, deps.database, cancelExportEndpoint, 'read', async ({ place, actor, param }) => {
    cancelExport(jobs, place, actor, param('export'));
  });

  mountProblem(app, deps.database, getExportFileEndpoint, 'read', async ({ place, actor, param, response }) =>
    sendPdf(response, getExportFile(jobs, place, actor, param('export'))),
  );

  mountProblem(app, deps.database, getReportPdf, 'read', async ({ place, response }) =>
    sendPdf(response, await printReport(deps, place)),
  );
}
