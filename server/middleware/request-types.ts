import 'express-session';
import type { Actor } from './actor.ts';

declare global {
  // The only way Express offers to say what our middlewares add to a request.
  // eslint-disable-next-line @typescript-eslint/no-namespace
  namespace Express {
    interface Request {
      /** Names this request in the log and in every error that is answered. */
      requestId: string;
    }
    interface User extends Omit<Actor, 'sessionId'> {
      readonly id: string;
    }
  }
}

declare module 'express-session' {
  interface SessionData {
    /** Set before a token is issued, so that the session exists and keeps its id. */
    csrf?: true;
    passport?: { user?: string };
  }
}
