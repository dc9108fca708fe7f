import type { Migration } from '../migration.ts';

export const reports: Migration = {
  name: '0004-reports',
  async up(run) {
    await run(`CREATE TABLE report_docs (
      problem_id TEXT PRIMARY KEY REFERENCES problems (id) ON DELETE CASCADE,
      lineage TEXT NOT NULL,
      schema_version INTEGER NOT NULL,
      state BLOB NOT NULL,
      updated_at TEXT NOT NULL
    )`);
    await run(`CREATE TABLE report_updates (
      id INTEGER PRIMARY KEY AUTOINCREMENT,
      problem_id TEXT NOT NULL REFERENCES problems (id) ON DELETE CASCADE,
      user_id TEXT REFERENCES users (id),
      at TEXT NOT NULL,
      data BLOB NOT NULL
    )`);
    await run('CREATE INDEX report_updates_by_problem ON report_updates (problem_id, id)');
    await run(`CREATE TABLE files (
      problem_id TEXT NOT NULL REFERENCES problems (id) ON DELETE CASCADE,
      sha TEXT NOT NULL,
      type TEXT NOT NULL,
      width INTEGER NOT NULL,
      height INTEGER NOT NULL,
      bytes INTEGER NOT NULL,
      user_id TEXT REFERENCES users (id),
      at TEXT NOT NULL,
      PRIMARY KEY (problem_id, sha)
    )`);
  },
  async down(run) {
    for (const table of ['files', 'report_updates', 'report_docs']) await run(`DROP TABLE ${table}`);
  },
};
