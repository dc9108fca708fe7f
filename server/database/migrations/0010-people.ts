import type { Migration } from '../migration.ts';

export const invitations: Migration = {
  name: '0010-people',
  async up(run) {
    await run('ALTER TABLE users ADD COLUMN is_administrator INTEGER NOT NULL DEFAULT 0');
    await run(`CREATE TABLE tokens (
      token_hash TEXT PRIMARY KEY,
      kind TEXT NOT NULL CHECK (kind IN ('setup', 'reset')),
      user_id TEXT REFERENCES users (id) ON DELETE CASCADE,
      expires_at TEXT NOT NULL
    )`);
    await run('CREATE INDEX tokens_by_user ON tokens (user_id)');
    await run(`CREATE TABLE invitations (
      id TEXT PRIMARY KEY,
      team_id TEXT NOT NULL REFERENCES teams (id) ON DELETE CASCADE,
      token_hash TEXT NOT NULL UNIQUE,
      email TEXT NOT NULL,
      name TEXT NOT NULL,
      role TEXT NOT NULL CHECK (role IN ('captain', 'member', 'advisor')),
      invited_by TEXT NOT NULL REFERENCES users (id),
      invited_at TEXT NOT NULL,
      expires_at TEXT NOT NULL
    )`);
    await run('CREATE INDEX invitations_by_team ON invitations (team_id, invited_at)');
    // A mail's link opens something: it stands apart from the text and is gone once the mail is sent.
    await run(`CREATE TABLE outbox (
      id TEXT PRIMARY KEY,
      team_id TEXT REFERENCES teams (id) ON DELETE CASCADE,
      concerns TEXT,
      kind TEXT NOT NULL,
      address TEXT NOT NULL,
      name TEXT NOT NULL,
      subject TEXT NOT NULL,
      text TEXT NOT NULL,
      link TEXT,
      state TEXT NOT NULL CHECK (state IN ('waiting', 'sent', 'failed')),
      tries INTEGER NOT NULL,
      next_try_at TEXT,
      error TEXT,
      written_at TEXT NOT NULL,
      sent_at TEXT
    )`);
    await run('CREATE INDEX outbox_by_state ON outbox (state, next_try_at)');
    await run('CREATE INDEX outbox_by_team ON outbox (team_id, written_at)');
  },
  async down(run) {
    for (const table of ['outbox', 'invitations', 'tokens']) await run(`DROP TABLE ${table}`);
    await run('ALTER TABLE users DROP COLUMN is_administrator');
  },
};
