import { STATUS_CODES } from 'node:http';
import type { IncomingMessage, Server } from 'node:http';
import type { Duplex } from 'node:stream';
import { WebSocketServer } from 'ws';
import type { WebSocket } from 'ws';
import type { Logger } from 'pino';
import type { Actor } from '#server/middleware/actor.ts';
import type { OpenSockets } from './open-sockets.ts';

export type OnSocket = (socket: WebSocket, request: IncomingMessage, actor: Actor) => void;

export interface SocketUpgrades {
  /** Takes the sockets of one path, signed in and from our own pages only. */
  on(path: string, onSocket: OnSocket): void;
}

interface UpgradeDeps {
  readonly findActor: (request: IncomingMessage) => Promise<Actor | null>;
  readonly sockets: OpenSockets;
  readonly logger: Logger;
}

const MAX_MESSAGE_BYTES = 8 * 1024 * 1024;

/** Turns HTTP requests into sockets: another origin is refused with 403, an unknown path with 404, the signed out with 401. */
export function attachSocketUpgrades(server: Server, deps: UpgradeDeps): SocketUpgrades {
  const paths = new Map<string, OnSocket>();
  const accepting = new WebSocketServer({ noServer: true, maxPayload: MAX_MESSAGE_BYTES });
  server.on('upgrade', (request, socket, head) => {
    // Vite's own channel for hot reloading, while developing.
    if (request.headers['sec-websocket-protocol']?.startsWith('vite-')) return;
    socket.on('error', () => socket.destroy());
    const onSocket = paths.get(pathOf(request));
    if (!onSocket) return refuse(socket, 404);
    if (!isOwnOrigin(request)) return refuse(socket, 403);
    deps.findActor(request).then(
      (actor) => {
        if (!actor) return refuse(socket, 401);
        accepting.handleUpgrade(request, socket, head, (opened) => {
          deps.sockets.add(opened, actor);
          opened.on('error', () => opened.terminate());
          onSocket(opened, request, actor);
        });
      },
      (error: unknown) => {
        deps.logger.error({ err: error }, 'a socket could not be opened');
        refuse(socket, 500);
      },
    );
  });
  return { on: (path, onSocket) => void paths.set(path, onSocket) };
}

function pathOf(request: IncomingMessage): string {
  return (request.url ?? '/').split('?')[0] ?? '/';
}

/** Browsers send cookies with a socket to anywhere, but always say from where: a page of another site is refused. */
function isOwnOrigin(request: IncomingMessage): boolean {
  const { origin, host } = request.headers;
  if (origin === undefined) return true;
  return URL.canParse(origin) && new URL(origin).host === host;
}

function refuse(socket: Duplex, status: number): void {
  socket.end(`HTTP/1.1 ${status} ${STATUS_CODES[status]}\r\nConnection: close\r\nContent-Length: 0\r\n\r\n`);
}
