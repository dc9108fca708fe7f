import { HocuspocusProvider, HocuspocusProviderWebsocket } from '@hocuspocus/provider';
import { WebSocket } from 'ws';
import * as Y from 'yjs';
import { schemaToken } from '#shared/report/schema/schema-token.ts';

/** A writer at a report without an editor: the provider that the browser uses, on a real socket. */
export interface ReportClient {
  readonly doc: Y.Doc;
  readonly fragment: Y.XmlFragment;
  readonly provider: HocuspocusProvider;
  /** Resolves with the scope once everything has arrived, rejects with the reason of a refusal. */
  readonly ready: Promise<string>;
  /** Resolves once the server has acknowledged everything typed so far. */
  kept(): Promise<void>;
  /** Types a paragraph at the end of a section, by its place. */
  type(section: number, text: string): void;
  text(): string;
  close(): void;
}

export function openReport(
  url: string,
  cookie: string,
  name = 'team/tern-rock/problem/1',
  token: string = schemaToken(),
): ReportClient {
  class SocketWithCookie extends WebSocket {
    constructor(address: string | URL) {
      super(address, { headers: { cookie } });
    }
  }
  const socket = new HocuspocusProviderWebsocket({
    url: `${url.replace(/^http/, 'ws')}/collaboration`,
    WebSocketPolyfill: SocketWithCookie,
    delay: 50,
    minDelay: 50,
    maxDelay: 200,
  });
  const doc = new Y.Doc();
  const provider = new HocuspocusProvider({ websocketProvider: socket, name, document: doc, token });
  let scope = '';
  const ready = new Promise<string>((resolve, reject) => {
    provider.on('authenticated', (event: { scope: string }) => (scope = event.scope));
    provider.on('authenticationFailed', ({ reason }: { reason: string }) => reject(new Error(reason)));
    provider.on('synced', () => resolve(scope));
  });
  ready.catch(() => undefined);
  provider.attach();
  const fragment = doc.getXmlFragment('report');
  return {
    doc,
    fragment,
    provider,
    ready,
    kept: () =>
      new Promise((resolve) => {
        const check = () => (provider.unsyncedChanges === 0 ? resolve() : setTimeout(check, 5));
        check();
      }),
    type(section, text) {
      const paragraph = new Y.XmlElement('paragraph');
      paragraph.insert(0, [new Y.XmlText(text)]);
      const target = fragment.get(section);
      if (!(target instanceof Y.XmlElement)) throw new Error(`type: there is no section ${section}`);
      target.insert(target.length, [paragraph]);
    },
    text: () => fragment.toString(),
    close() {
      provider.destroy();
      socket.destroy();
      doc.destroy();
    },
  };
}
