/** The report of a problem on disk: one state and the updates since. What is acknowledged to a writer is in here. */
import { randomUUID } from 'node:crypto';
import type { Transaction } from 'sequelize';
import * as Y from 'yjs';
import { prosemirrorJSONToYDoc, yXmlFragmentToProseMirrorRootNode } from '@tiptap/y-tiptap';
import { emptyReport } from '#shared/report/schema/empty-report.ts';
import type { ReportDocument } from '#shared/report/schema/report-node.ts';
import { REPORT_SCHEMA_VERSION } from '#shared/report/schema/report-schema-version.ts';
import { reportSchema } from '#shared/report/schema/report-schema.ts';
import type { Database } from '#server/database/database.ts';

/** Name of the fragment that holds the report inside its Yjs document. */
export const REPORT_FRAGMENT = 'report';

/** Everything that is stored of a report, in the order in which it must be applied. */
export interface StoredReport {
  readonly lineage: string;
  readonly schemaVersion: number;
  readonly updates: readonly Uint8Array[];
  /** Id of the newest update; 0 when the state has them all. */
  readonly lastUpdate: number;
}

/** Makes the document of a problem. Only the server does, and once: two seeds merged would double every paragraph. */
export async function seedReport(
  database: Database,
  problemId: string,
  document: ReportDocument,
  at: string,
  transaction: Transaction,
): Promise<void> {
  const seeded = prosemirrorJSONToYDoc(reportSchema(), document, REPORT_FRAGMENT);
  await database.models.reportDocs.create(
    {
      problemId,
      lineage: randomUUID(),
      schemaVersion: REPORT_SCHEMA_VERSION,
      state: Buffer.from(Y.encodeStateAsUpdate(seeded)),
      updatedAt: at,
    },
    { transaction },
  );
  seeded.destroy();
}

/** What is stored of a report; an empty one is made where there was none. */
export async function getStoredReport(
  database: Database,
  problemId: string,
  now: Date,
): Promise<StoredReport> {
  const stored = await findStoredReport(database, problemId);
  if (stored) return stored;
  await database.write(async (transaction) => {
    const count = await database.models.reportDocs.count({ where: { problemId }, transaction });
    if (count === 0) await seedReport(database, problemId, emptyReport(), now.toISOString(), transaction);
  });
  const seeded = await findStoredReport(database, problemId);
  if (!seeded) throw new Error(`getStoredReport: the report of ${problemId} is not there after it was made`);
  return seeded;
}

async function findStoredReport(database: Database, problemId: string): Promise<StoredReport | null> {
  return database.read(async (transaction) => {
    const { reportDocs, reportUpdates } = database.models;
    const row = await reportDocs.findByPk(problemId, { transaction });
    if (!row) return null;
    const log = await reportUpdates.findAll({ where: { problemId }, order: [['id', 'ASC']], transaction });
    return {
      lineage: row.lineage,
      schemaVersion: row.schemaVersion,
      updates: [row.state, ...log.map(({ data }) => data)],
      lastUpdate: log.at(-1)?.id ?? 0,
    };
  });
}

/** Puts one update on disk; when this returns, it survives whatever happens to the process. */
export async function appendReportUpdate(
  database: Database,
  update: {
    readonly problemId: string;
    readonly userId: string;
    readonly at: string;
    readonly data: Uint8Array;
  },
): Promise<void> {
  await database.write((transaction) =>
    database.models.reportUpdates.create({ ...update, data: Buffer.from(update.data) }, { transaction }),
  );
}

/**
 * Draws the state and the log together. It reads from disk, never from memory, does the heavy work outside the
 * transaction, and removes only what it has read; updates that arrive meanwhile stay in the log.
 */
export async function compactReport(database: Database, problemId: string, now: Date): Promise<void> {
  const stored = await findStoredReport(database, problemId);
  if (!stored || stored.lastUpdate === 0) return;
  const drawn = drawTogether(stored.updates);
  const state = Buffer.from(Y.encodeStateAsUpdate(drawn));
  drawn.destroy();
  const { reportDocs } = database.models;
  await database.write(async (transaction) => {
    await reportDocs.update({ state, updatedAt: now.toISOString() }, { where: { problemId }, transaction });
    await database.sequelize.query(
      'DELETE FROM report_updates WHERE problem_id = :problemId AND id <= :last',
      {
        replacements: { problemId, last: stored.lastUpdate },
        transaction,
      },
    );
  });
}

function drawTogether(updates: readonly Uint8Array[]): Y.Doc {
  const document = new Y.Doc();
  document.transact(() => {
    for (const update of updates) Y.applyUpdate(document, update);
  });
  return document;
}

/** A report as its readers get it. */
export interface ReadReport {
  readonly schemaVersion: number;
  readonly lineage: string;
  readonly document: ReportDocument;
}

/** The report of a problem as JSON: all that has been acknowledged, whether or not somebody has it open. */
export async function documentOf(database: Database, problemId: string, now: Date): Promise<ReadReport> {
  const { lineage, schemaVersion, updates } = await getStoredReport(database, problemId, now);
  const drawn = drawTogether(updates);
  const node = yXmlFragmentToProseMirrorRootNode(drawn.getXmlFragment(REPORT_FRAGMENT), reportSchema());
  drawn.destroy();
  node.check();
  return { schemaVersion, lineage, document: node.toJSON() as ReportDocument };
}
