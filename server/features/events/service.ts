import type { WebSocket } from 'ws';
import type { EvidenceStep, ServerEvent, Stale } from '#shared/contracts/evidence-changes.ts';
import type { ProblemPlace, TeamPlace } from '#server/features/teams/service.ts';
import type { Actor } from '#server/middleware/actor.ts';

/** What one tab has open. */
interface Listener {
  readonly socket: WebSocket;
  readonly actor: Actor;
  /** Teams of the person. A change of role closes the socket, so the list stays true as long as it is open. */
  readonly teams: ReadonlySet<string>;
  watching: { readonly place: ProblemPlace; readonly where: string } | null;
}

/** A socket that cannot keep up is closed; its tab comes back and asks for the whole. */
const MAX_WAITING_BYTES = 4 * 1024 * 1024;

/** Tells open tabs what changed: evidence to those who watch the problem, the rest to everybody of the team. */
export class EventHub {
  readonly #listeners = new Map<WebSocket, Listener>();

  join(socket: WebSocket, actor: Actor, teams: ReadonlySet<string>): void {
    this.#listeners.set(socket, { socket, actor, teams, watching: null });
    socket.once('close', () => {
      const place = this.#listeners.get(socket)?.watching?.place;
      this.#listeners.delete(socket);
      if (place) this.#tellWhoIsHere(place);
    });
  }

  /** From now on this tab is told every step of this problem. The caller has checked that the person may read it. */
  watch(socket: WebSocket, place: ProblemPlace, where: string): void {
    const listener = this.#listeners.get(socket);
    if (!listener) return;
    const before = listener.watching?.place;
    listener.watching = { place, where };
    if (before && before.problem.id !== place.problem.id) this.#tellWhoIsHere(before);
    this.#tellWhoIsHere(place);
  }

  leave(socket: WebSocket): void {
    const listener = this.#listeners.get(socket);
    const before = listener?.watching?.place;
    if (!listener || !before) return;
    listener.watching = null;
    this.#tellWhoIsHere(before);
  }

  /** Call inside the write of the step, after its commit, so that steps leave in the order of their versions. */
  publishStep(place: ProblemPlace, step: EvidenceStep): void {
    const event: ServerEvent = {
      type: 'evidence',
      team: place.team.slug,
      number: place.problem.number,
      step,
    };
    const text = JSON.stringify(event);
    for (const listener of this.#watchersOf(place)) send(listener.socket, text);
  }

  /** Something of the team, or of one of its problems, is to be asked for again. */
  publishStale(place: TeamPlace, what: Stale, number?: number): void {
    const event: ServerEvent = {
      type: 'stale',
      what,
      team: place.team.slug,
      ...(number === undefined ? {} : { number }),
    };
    const text = JSON.stringify(event);
    for (const { socket, teams } of this.#listeners.values()) {
      if (teams.has(place.team.id)) send(socket, text);
    }
  }

  #watchersOf(place: ProblemPlace): Listener[] {
    return [...this.#listeners.values()].filter(
      ({ watching }) => watching?.place.problem.id === place.problem.id,
    );
  }

  /** Each watcher hears of the others, once each however many tabs they have. */
  #tellWhoIsHere(place: ProblemPlace): void {
    const watchers = this.#watchersOf(place);
    for (const listener of watchers) {
      const others = new Map<string, { name: string; where: string }>();
      for (const { actor, watching } of watchers) {
        if (actor.id !== listener.actor.id && watching) {
          others.set(actor.id, { name: actor.name, where: watching.where });
        }
      }
      const event: ServerEvent = {
        type: 'here',
        team: place.team.slug,
        number: place.problem.number,
        people: [...others.values()],
      };
      send(listener.socket, JSON.stringify(event));
    }
  }
}

function send(socket: WebSocket, text: string): void {
  if (socket.readyState !== socket.OPEN) return;
  if (socket.bufferedAmount > MAX_WAITING_BYTES) socket.terminate();
  else socket.send(text);
}
