import type { IncomingMessage } from 'node:http';
import type { ServerDeps } from '#server/deps.ts';
import type { SocketUpgrades } from '#server/sockets/socket-upgrades.ts';
import { Compactions } from './compactions.ts';
import { createReportEditing } from './report-editing.ts';

export const COLLABORATION_PATH = '/collaboration';

export interface Collaboration {
  /** Draws together what is open. Call it after the sockets are closed and before the database is. */
  close(): Promise<void>;
}

/** Takes the sockets of co-editing; path, origin and session have been checked on the way in. */
export function attachCollaboration(upgrades: SocketUpgrades, deps: ServerDeps): Collaboration {
  const compactions = new Compactions(deps.logger);
  const editing = createReportEditing(deps, compactions);
  upgrades.on(COLLABORATION_PATH, (socket, request, actor) => {
    const connection = editing.handleConnection(socket, toRequest(request), { actor, socket });
    socket.on('message', (data: Buffer) => connection.handleMessage(new Uint8Array(data)));
    socket.on('close', (code, reason) => connection.handleClose({ code, reason: reason.toString() }));
  });
  return {
    async close() {
      editing.flushPendingStores();
      await compactions.idle();
    },
  };
}

function toRequest(request: IncomingMessage): Request {
  const headers = new Headers();
  for (const [name, value] of Object.entries(request.headers)) {
    if (typeof value === 'string') headers.set(name, value);
  }
  return new Request(new URL(request.url ?? '/', `http://${request.headers.host ?? 'localhost'}`), {
    headers,
  });
}
