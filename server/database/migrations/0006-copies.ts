import type { Migration } from '../migration.ts';

export const copies: Migration = {
  name: '0006-copies',
  async up(run) {
    await run(`CREATE TABLE copies (
      id TEXT PRIMARY KEY,
      team_id TEXT NOT NULL REFERENCES teams (id),
      problem_id TEXT NOT NULL REFERENCES problems (id),
      edition_id TEXT NOT NULL REFERENCES editions (id),
      number INTEGER NOT NULL CHECK (number > 0),
      token_hash TEXT NOT NULL UNIQUE,
      recipient TEXT NOT NULL,
      recipient_team_id TEXT REFERENCES teams (id),
      reader TEXT NOT NULL,
      passphrase_hash TEXT,
      opens_at TEXT NOT NULL,
      closes_at TEXT NOT NULL,
      may_print INTEGER NOT NULL,
      lent_at TEXT NOT NULL,
      lent_by TEXT NOT NULL REFERENCES users (id),
      revoked_at TEXT,
      revoked_by TEXT REFERENCES users (id),
      UNIQUE (problem_id, number)
    )`);
    await run('CREATE INDEX copies_by_team ON copies (team_id, lent_at)');
    await run('CREATE INDEX copies_by_recipient ON copies (recipient_team_id, lent_at)');
    await run(`CREATE TABLE copy_views (
      id INTEGER PRIMARY KEY AUTOINCREMENT,
      copy_id TEXT NOT NULL REFERENCES copies (id) ON DELETE CASCADE,
      at TEXT NOT NULL,
      kind TEXT NOT NULL
    )`);
    await run('CREATE INDEX copy_views_by_copy ON copy_views (copy_id, kind, at)');
    await run(`CREATE TABLE copy_rooms (
      copy_id TEXT PRIMARY KEY REFERENCES copies (id) ON DELETE CASCADE,
      key_hash TEXT NOT NULL,
      key_set_at TEXT NOT NULL,
      seconds INTEGER NOT NULL
    )`);
    await run(`CREATE TABLE copy_questions (
      id TEXT PRIMARY KEY,
      copy_id TEXT NOT NULL REFERENCES copy_rooms (copy_id) ON DELETE CASCADE,
      position INTEGER NOT NULL,
      text TEXT NOT NULL,
      about TEXT,
      seconds INTEGER NOT NULL,
      written_at TEXT NOT NULL
    )`);
    await run('CREATE INDEX copy_questions_by_copy ON copy_questions (copy_id, position)');
  },
  async down(run) {
    for (const table of ['copy_questions', 'copy_rooms', 'copy_views', 'copies'])
      await run(`DROP TABLE ${table}`);
  },
};
