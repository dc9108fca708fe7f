import type { WebSocket } from 'ws';
import type { Actor } from '#server/middleware/actor.ts';
import type { ProblemPlace } from '#server/features/teams/service.ts';

/** Who is behind a co-editing socket; `place` is known once a document of it has been allowed. */
export interface EditingContext {
  readonly actor: Actor;
  readonly socket: WebSocket;
  readonly place?: ProblemPlace | undefined;
}

/** An error whose reason the client is told. */
export class EditingRefusal extends Error {
  readonly reason: 'schema-version' | 'not-found';

  constructor(reason: EditingRefusal['reason']) {
    super(reason);
    this.reason = reason;
  }
}
