import session from 'express-session';
import type { SessionData } from 'express-session';
import createStoreClass from 'connect-session-sequelize';
import type { Database } from '#server/database/database.ts';

type Done = (error?: unknown) => void;

const SequelizeStore = createStoreClass(session.Store);

/** Sessions in the database. Their writes wait their turn among all writers, or they would block the thread pool. */
class QueuedSessionStore extends SequelizeStore {
  readonly #database: Database;
  readonly #now: () => Date;

  constructor(database: Database, now: () => Date) {
    super({
      db: database.sequelize,
      table: 'sessions',
      checkExpirationInterval: 0,
      disableTouch: true,
      extendDefaultFields: (fields: object, data: SessionData) => ({
        ...fields,
        userId: data.passport?.user ?? null,
      }),
    } as ConstructorParameters<typeof SequelizeStore>[0]);
    this.#database = database;
    this.#now = now;
  }

  /** A session whose time is over is none, even before it is cleared away. */
  override get(sid: string, done: (error: unknown, data?: SessionData | null) => void): void {
    super.get(sid, (error: unknown, data?: SessionData | null) => {
      const expires = data?.cookie.expires;
      const isOver = expires !== undefined && expires !== null && new Date(expires) <= this.#now();
      done(error, isOver ? null : data);
    });
  }

  override set(sid: string, data: SessionData, done: Done = () => undefined): void {
    this.#queue((finished) => super.set(sid, data, finished), done);
  }

  override destroy(sid: string, done: Done = () => undefined): void {
    this.#queue((finished) => super.destroy(sid, finished), done);
  }

  #queue(write: (finished: Done) => void, done: Done): void {
    this.#database
      .writeAlone(
        () =>
          new Promise<void>((resolve, reject) => {
            write((error) => (error ? reject(error) : resolve()));
          }),
      )
      .then(
        () => done(),
        (error: unknown) => done(error),
      );
  }
}

export function createSessionStore(database: Database, now: () => Date): session.Store {
  return new QueuedSessionStore(database, now);
}
