import sqlite3 from 'sqlite3';

/**
 * A connection that brings its own settings. Sequelize opens a new connection for each transaction and offers no
 * hook there, so a PRAGMA sent as a query would be missing where it matters most.
 */
class ConfiguredDatabase extends sqlite3.Database {
  constructor(filename: string, mode?: number, opened?: (error: Error | null) => void) {
    super(filename, mode ?? sqlite3.OPEN_READWRITE | sqlite3.OPEN_CREATE, (error) => {
      if (error) {
        opened?.(error);
        return;
      }
      this.configure('busyTimeout', 10_000);
      this.exec(
        'PRAGMA journal_mode = WAL; PRAGMA synchronous = FULL; PRAGMA foreign_keys = ON;',
        (failure) => opened?.(failure),
      );
    });
  }
}

/** What Sequelize takes as its SQLite module. */
export const sqliteDriver = { ...sqlite3, Database: ConfiguredDatabase };
