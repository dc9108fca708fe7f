import type { Migration } from '../migration.ts';

export const people: Migration = {
  name: '0001-people',
  async up(run) {
    await run(`CREATE TABLE users (
      id TEXT PRIMARY KEY,
      email TEXT NOT NULL UNIQUE,
      name TEXT NOT NULL,
      passphrase_hash TEXT NOT NULL,
      passphrase_changed_at TEXT,
      disabled_at TEXT,
      created_at TEXT NOT NULL
    )`);
    await run(`CREATE TABLE sessions (
      sid TEXT PRIMARY KEY,
      user_id TEXT REFERENCES users (id) ON DELETE CASCADE,
      expires DATETIME NOT NULL,
      data TEXT NOT NULL
    )`);
    await run('CREATE INDEX sessions_by_user ON sessions (user_id)');
    await run('CREATE INDEX sessions_by_expiry ON sessions (expires)');
    await run(`CREATE TABLE teams (
      id TEXT PRIMARY KEY,
      slug TEXT NOT NULL UNIQUE,
      name TEXT NOT NULL,
      university TEXT NOT NULL,
      is_demo INTEGER NOT NULL DEFAULT 0,
      season_from TEXT NOT NULL,
      season_to TEXT NOT NULL
    )`);
    await run(`CREATE TABLE memberships (
      team_id TEXT NOT NULL REFERENCES teams (id) ON DELETE CASCADE,
      user_id TEXT NOT NULL REFERENCES users (id) ON DELETE CASCADE,
      role TEXT NOT NULL CHECK (role IN ('captain', 'member', 'advisor')),
      position INTEGER NOT NULL,
      PRIMARY KEY (team_id, user_id)
    )`);
    await run('CREATE INDEX memberships_by_user ON memberships (user_id)');
    await run(`CREATE TABLE fights (
      id TEXT PRIMARY KEY,
      team_id TEXT NOT NULL REFERENCES teams (id) ON DELETE CASCADE,
      name TEXT NOT NULL,
      at TEXT NOT NULL,
      place TEXT,
      result TEXT,
      stages TEXT NOT NULL
    )`);
    await run('CREATE INDEX fights_by_team ON fights (team_id, at)');
  },
  async down(run) {
    for (const table of ['fights', 'memberships', 'teams', 'sessions', 'users']) {
      await run(`DROP TABLE ${table}`);
    }
  },
};
