import { HocuspocusProvider, HocuspocusProviderWebsocket } from '@hocuspocus/provider';
import { IndexeddbPersistence } from 'y-indexeddb';
import * as Y from 'yjs';
import { getSession } from '#shared/contracts/session.ts';
import { schemaToken } from '#shared/report/schema/schema-token.ts';
import { call } from '#src/lib/api/call.ts';
import type { ProblemAddress } from '#src/lib/problem/problem-address.ts';
import { createStore, type Store } from '#src/lib/store/create-store.ts';

/** How things stand between this browser's text and the server's disk. */
export interface ReportState {
  /** opening: nothing to show yet; open: there is text; refused: this page is older or newer than the server. */
  readonly phase: 'opening' | 'open' | 'refused' | 'gone';
  readonly readOnly: boolean;
  readonly isConnected: boolean;
  /** Changes that the server has not said to be on disk. */
  readonly unsynced: number;
  /** When the server last said that everything is on disk; null: not yet. */
  readonly keptAt: Date | null;
}

export interface ReportSession {
  readonly doc: Y.Doc;
  readonly fragment: Y.XmlFragment;
  readonly provider: HocuspocusProvider;
  readonly state: Store<ReportState>;
  close(): void;
}

const FIRST_RETRY_MS = 300;
const LONGEST_RETRY_MS = 3_000;
/** A line that stays away this long may have been cut because the session ended: ask, so that one may sign in again. */
const ASK_SESSION_AFTER_MS = 4_000;

/** Opens the co-editing of a report. The browser keeps its own copy under the document's lineage. */
export function openReportSession(address: ProblemAddress, lineage: string): ReportSession {
  const doc = new Y.Doc();
  const name = `team/${address.team}/problem/${address.number}`;
  const socket = new HocuspocusProviderWebsocket({
    url: `${window.location.origin.replace(/^http/, 'ws')}/collaboration`,
    delay: FIRST_RETRY_MS,
    minDelay: FIRST_RETRY_MS,
    maxDelay: LONGEST_RETRY_MS,
  });
  const provider = new HocuspocusProvider({
    websocketProvider: socket,
    name,
    document: doc,
    token: schemaToken(),
  });
  const local = new IndexeddbPersistence(`report ${name} ${lineage}`, doc);
  const fragment = doc.getXmlFragment('report');
  const state = createStore<ReportState>({
    phase: 'opening',
    readOnly: true,
    isConnected: false,
    unsynced: 0,
    keptAt: null,
  });
  const change = (next: Partial<ReportState>) => state.set({ ...state.get(), ...next });
  const tellKept = () => {
    const unsynced = provider.unsyncedChanges;
    const isKept = unsynced === 0 && provider.isSynced;
    change({ unsynced, ...(isKept ? { keptAt: new Date() } : {}) });
  };
  let asking: ReturnType<typeof setTimeout> | null = null;
  const stopAsking = () => {
    if (asking !== null) clearTimeout(asking);
    asking = null;
  };
  provider.on('authenticated', ({ scope }: { scope: string }) => change({ readOnly: scope === 'readonly' }));
  provider.on('authenticationFailed', ({ reason }: { reason: string }) => {
    change({ phase: reason === 'schema-version' ? 'refused' : 'gone', readOnly: true });
  });
  provider.on('synced', () => {
    change({ phase: 'open' });
    tellKept();
  });
  provider.on('unsyncedChanges', tellKept);
  provider.on('status', ({ status }: { status: string }) => {
    const isConnected = status === 'connected';
    change({ isConnected });
    stopAsking();
    if (!isConnected)
      asking = setTimeout(() => void call(getSession, {}).catch(() => undefined), ASK_SESSION_AFTER_MS);
  });
  void local.whenSynced.then(() => {
    if (fragment.length > 0 && state.get().phase === 'opening') change({ phase: 'open' });
  });
  provider.attach();
  return {
    doc,
    fragment,
    provider,
    state,
    close() {
      stopAsking();
      provider.destroy();
      socket.destroy();
      void local.destroy();
      doc.destroy();
    },
  };
}
