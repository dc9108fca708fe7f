import type { WebSocket } from 'ws';
import type { Actor } from '#server/middleware/actor.ts';

/** Close codes of ours; the client asks for its session again on any of them. */
export const SOCKET_CODES = { restart: 1001, signedOut: 4401, notYours: 4403 } as const;

/** Every open socket and who is behind it, so that losing a session or a role ends what is open at once. */
export class OpenSockets {
  readonly #owners = new Map<WebSocket, Actor>();

  add(socket: WebSocket, actor: Actor): void {
    this.#owners.set(socket, actor);
    socket.once('close', () => this.#owners.delete(socket));
  }

  /** After signing out: the sockets of that one session. */
  closeSession(sessionId: string): void {
    this.#close((actor) => actor.sessionId === sessionId, SOCKET_CODES.signedOut, 'signed out');
  }

  /** After a change of passphrase: the person's sockets of every other session. */
  closeOthers(userId: string, keptSessionId: string): void {
    this.#close(
      (actor) => actor.id === userId && actor.sessionId !== keptSessionId,
      SOCKET_CODES.signedOut,
      'signed out',
    );
  }

  /** After a forgotten passphrase was set anew, or an account was locked: all of the person's sockets. */
  signOutPerson(userId: string): void {
    this.#close((actor) => actor.id === userId, SOCKET_CODES.signedOut, 'signed out');
  }

  /** After a change of role: all of the person's sockets. They come back with the new role. */
  closePerson(userId: string): void {
    this.#close((actor) => actor.id === userId, SOCKET_CODES.notYours, 'role changed');
  }

  closeAll(): void {
    this.#close(() => true, SOCKET_CODES.restart, 'restart');
  }

  /** Ends what has not closed politely. */
  terminateAll(): void {
    for (const socket of this.#owners.keys()) socket.terminate();
  }

  #close(concerns: (actor: Actor) => boolean, code: number, reason: string): void {
    for (const [socket, actor] of this.#owners) if (concerns(actor)) socket.close(code, reason);
  }
}
