import { ServerResponse } from 'node:http';
import type { IncomingMessage } from 'node:http';
import session from 'express-session';
import type { Request, RequestHandler, Response } from 'express';
import { Passport } from 'passport';
import { Strategy } from 'passport-local';
import type { Database } from '#server/database/database.ts';
import type { Actor } from '#server/middleware/actor.ts';
import { checkSignIn, findUser } from '#server/features/account/service.ts';
import { createSessionStore } from './session-store.ts';

export interface SessionLayer {
  /** For Express, in this order. */
  readonly handlers: readonly RequestHandler[];
  /** Checks the e-mail and passphrase of the body; null when they do not fit. */
  readonly checkCredentials: (request: Request, response: Response) => Promise<Express.User | null>;
  /** Begins a session of this person, under a new id. */
  readonly logIn: (request: Request, user: Express.User) => Promise<void>;
  /** The same sessions for a request outside Express: the upgrade to a socket. */
  readonly findActor: (request: IncomingMessage) => Promise<Actor | null>;
}

const DAY = 86_400_000;

/** Cookie sessions kept in the database, and passport on top of them. */
export function createSessionLayer(database: Database, secret: string, now: () => Date): SessionLayer {
  const passport = new Passport();
  passport.use(
    new Strategy({ usernameField: 'email', passwordField: 'passphrase' }, (email, passphrase, done) => {
      checkSignIn(database, email, passphrase).then(
        (user) => done(null, user ?? false),
        (error: unknown) => done(error),
      );
    }),
  );
  passport.serializeUser((user, done) => done(null, user.id));
  passport.deserializeUser((id: string, done) => {
    findUser(database, id).then(
      (user) => done(null, user ?? false),
      (error: unknown) => done(error),
    );
  });
  const sessions = session({
    name: 'holdwater',
    secret,
    store: createSessionStore(database, now),
    resave: false,
    saveUninitialized: false,
    cookie: { httpOnly: true, sameSite: 'lax', secure: 'auto', maxAge: 14 * DAY },
  });
  const signedIn = passport.session();
  return {
    handlers: [sessions, signedIn],
    checkCredentials: (request, response) =>
      new Promise((resolve, reject) => {
        const decide = (error: unknown, user: Express.User | false | undefined) =>
          error ? reject(error) : resolve(user || null);
        passport.authenticate('local', decide)(request, response, reject);
      }),
    logIn: (request, user) =>
      new Promise((resolve, reject) => {
        request.login(user, (error: unknown) => (error ? reject(error) : resolve()));
      }),
    findActor: (message) => findActor(message, [sessions, signedIn]),
  };
}

/** Runs the session handlers on a bare request. They only need a response to hang a cookie on, which is never sent. */
async function findActor(
  message: IncomingMessage,
  handlers: readonly RequestHandler[],
): Promise<Actor | null> {
  const request = message as Request;
  const response = new ServerResponse(message) as Response;
  for (const handler of handlers) {
    await new Promise<void>((resolve, reject) => {
      void handler(request, response, (error?: unknown) => (error ? reject(error) : resolve()));
    });
  }
  return request.user ? { ...request.user, sessionId: request.sessionID } : null;
}
