import type { Express } from 'express';
import { getHealth } from '#shared/contracts/session.ts';
import { REPORT_SCHEMA_VERSION } from '#shared/report/schema/report-schema-version.ts';
import type { ServerDeps } from '#server/deps.ts';
import { DEMO_COPY_TOKEN } from '#server/database/seeders/demo/seed-copy.ts';
import { listDemoSignIns } from '#server/features/account/service.ts';
import { findDemoCopy } from '#server/features/copies/service.ts';
import { mountOpen } from '#server/middleware/mount.ts';
import { VERSION } from './version.ts';

export function mountHealth(app: Express, deps: ServerDeps): void {
  mountOpen(app, getHealth, async () => ({
    ok: true as const,
    version: VERSION,
    reportSchema: REPORT_SCHEMA_VERSION,
    demo: deps.environment.demo ? await demoSignIns(deps) : null,
    demoCopy: deps.environment.demo ? await findDemoCopy(deps, DEMO_COPY_TOKEN) : null,
  }));
}

async function demoSignIns({ database }: ServerDeps) {
  const people = await listDemoSignIns(database);
  return people?.map(({ name, email, passphrase, role }) => ({ name, email, passphrase, role })) ?? null;
}
