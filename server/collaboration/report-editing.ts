/**
 * The co-editing of reports: who may open which document, and what must be on disk before a writer is told that it is
 * kept. The order is the point: an update is written, then applied, then acknowledged.
 */
import { Hocuspocus } from '@hocuspocus/server';
import * as Y from 'yjs';
import { REPORT_SCHEMA_VERSION } from '#shared/report/schema/report-schema-version.ts';
import { schemaVersionOf } from '#shared/report/schema/schema-token.ts';
import type { ServerDeps } from '#server/deps.ts';
import { appendReportUpdate, compactReport, getStoredReport } from '#server/features/report/service.ts';
import { findProblemPlace } from '#server/features/teams/service.ts';
import type { ProblemPlace } from '#server/features/teams/service.ts';
import type { Compactions } from './compactions.ts';
import { parseDocumentName } from './document-name.ts';
import { EditingRefusal, type EditingContext } from './editing-context.ts';

/** After this long without a change the log is drawn together, at the latest after the second span. */
const COMPACT_AFTER_MS = 2_000;
const COMPACT_AT_LATEST_MS = 10_000;

/** Message types of y-protocols/sync. */
const SYNC_STEP_1 = 0;
const SYNC_STEP_2 = 1;
/** An update that says nothing: no structs, no deletions. */
const EMPTY_UPDATE_BYTES = 2;
const STORAGE_FAILED = 1011;

export function createReportEditing(deps: ServerDeps, compactions: Compactions): Hocuspocus<EditingContext> {
  return new Hocuspocus<EditingContext>({
    quiet: true,
    debounce: COMPACT_AFTER_MS,
    maxDebounce: COMPACT_AT_LATEST_MS,
    async onAuthenticate({ context, documentName, connectionConfig, token }) {
      // First of all: an editor that lacks a node deletes every such node for everybody by merely opening.
      if (schemaVersionOf(token) !== REPORT_SCHEMA_VERSION) throw new EditingRefusal('schema-version');
      const place = await findPlace(deps, context, documentName);
      if (!place) throw new EditingRefusal('not-found');
      connectionConfig.readOnly = place.role === 'advisor';
      return { place };
    },
    async onLoadDocument({ context, document }) {
      const { updates } = await getStoredReport(deps.database, placeOf(context).problem.id, deps.now());
      for (const update of updates) Y.applyUpdate(document, update);
    },
    async beforeSync({ context, document, connection, type, payload }) {
      if (type === SYNC_STEP_1 || connection.readOnly || payload.length <= EMPTY_UPDATE_BYTES) return;
      // A client that comes back repeats what it has: no need to write again what is there already.
      if (type === SYNC_STEP_2 && Y.snapshotContainsUpdate(Y.snapshot(document), payload)) return;
      await keep(deps, context, payload);
    },
    async onStoreDocument({ lastContext }) {
      const { place } = lastContext;
      if (!place) return;
      await compactions.run(place.problem.id, () =>
        compactReport(deps.database, place.problem.id, deps.now()),
      );
      deps.events.publishStale(place, 'report', place.problem.number);
      deps.events.publishStale(place, 'problems');
    },
    async beforeHandleAwareness({ context, states }) {
      // A caret carries its writer's name; the name is the session's, whatever the client says.
      for (const state of states.values()) {
        if (context && state && 'user' in state) state.user = { ...state.user, name: context.actor.name };
      }
    },
  });
}

async function findPlace(
  deps: ServerDeps,
  { actor }: EditingContext,
  documentName: string,
): Promise<ProblemPlace | null> {
  const wanted = parseDocumentName(documentName);
  return wanted ? findProblemPlace(deps.database, actor.id, wanted.team, wanted.number) : null;
}

function placeOf({ place }: EditingContext): ProblemPlace {
  if (!place) throw new Error('placeOf: needs a document that was allowed');
  return place;
}

async function keep(deps: ServerDeps, context: EditingContext, payload: Uint8Array): Promise<void> {
  try {
    await appendReportUpdate(deps.database, {
      problemId: placeOf(context).problem.id,
      userId: context.actor.id,
      at: deps.now().toISOString(),
      data: payload,
    });
  } catch (cause) {
    deps.logger.error({ err: cause }, 'an update of a report could not be written');
    // Closing makes the client send it again when it is back; swallowing it would lose it.
    setTimeout(() => context.socket.close(STORAGE_FAILED, 'storage'), 0);
    throw new Error('keep: the update could not be written', { cause });
  }
}
