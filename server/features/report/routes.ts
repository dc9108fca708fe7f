import type { Express } from 'express';
import { getReport } from '#shared/contracts/report.ts';
import type { ServerDeps } from '#server/deps.ts';
import { mountProblem } from '#server/middleware/mount.ts';
import { documentOf } from './service.ts';

export function mountReport(app: Express, deps: ServerDeps): void {
  mountProblem(app, deps.database, getReport, 'read', async ({ place }) =>
    documentOf(deps.database, place.problem.id, deps.now()),
  );
}
