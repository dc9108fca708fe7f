/** WS /events: one socket a tab, over which the server says what changed and the tab says what it has open. */
import type { WebSocket } from 'ws';
import { clientEventSchema } from '#shared/contracts/evidence-changes.ts';
import type { ClientEvent } from '#shared/contracts/evidence-changes.ts';
import type { ServerDeps } from '#server/deps.ts';
import { findProblemPlace, listTeamIds } from '#server/features/teams/service.ts';
import type { Actor } from '#server/middleware/actor.ts';
import { SOCKET_CODES } from '#server/sockets/open-sockets.ts';
import type { SocketUpgrades } from '#server/sockets/socket-upgrades.ts';

const HEARTBEAT_MS = 30_000;
const UNREADABLE = 1007;

export function attachEventStream(upgrades: SocketUpgrades, deps: ServerDeps): void {
  upgrades.on('/events', (socket, _request, actor) => {
    keepAlive(socket);
    let last = join(socket, actor, deps);
    socket.on('message', (data) => {
      const event = parseEvent(String(data));
      if (!event) {
        socket.close(UNREADABLE, 'not understood');
        return;
      }
      // One after the other: a quick "watch, leave" must not end as "leave, watch".
      last = last.then(() => obey(socket, actor, event, deps));
    });
  });
}

async function join(socket: WebSocket, actor: Actor, deps: ServerDeps): Promise<void> {
  try {
    deps.events.join(socket, actor, new Set(await listTeamIds(deps.database, actor.id)));
  } catch (error) {
    fail(socket, error, deps);
  }
}

async function obey(socket: WebSocket, actor: Actor, event: ClientEvent, deps: ServerDeps): Promise<void> {
  try {
    if (event.type === 'leave') {
      deps.events.leave(socket);
      return;
    }
    const place = await findProblemPlace(deps.database, actor.id, event.team, event.number);
    if (place) deps.events.watch(socket, place, event.where);
    else socket.close(SOCKET_CODES.notYours, 'nothing here');
  } catch (error) {
    fail(socket, error, deps);
  }
}

function parseEvent(text: string): ClientEvent | null {
  try {
    return clientEventSchema.parse(JSON.parse(text));
  } catch {
    return null;
  }
}

function fail(socket: WebSocket, error: unknown, deps: ServerDeps): void {
  deps.logger.error({ err: error }, 'an event socket failed');
  socket.close(1011, 'failed');
}

/** A tab whose machine fell asleep or lost its network is noticed within a minute. */
function keepAlive(socket: WebSocket): void {
  let isAlive = true;
  socket.on('pong', () => {
    isAlive = true;
  });
  const timer = setInterval(() => {
    if (!isAlive) {
      socket.terminate();
      return;
    }
    isAlive = false;
    socket.ping();
  }, HEARTBEAT_MS);
  timer.unref();
  socket.once('close', () => clearInterval(timer));
}
