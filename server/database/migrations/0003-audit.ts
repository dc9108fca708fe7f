import type { Migration } from '../migration.ts';

export const audit: Migration = {
  name: '0003-audit',
  async up(run) {
    await run(`CREATE TABLE audit_events (
      id INTEGER PRIMARY KEY AUTOINCREMENT,
      team_id TEXT NOT NULL REFERENCES teams (id),
      problem_id TEXT REFERENCES problems (id),
      version INTEGER,
      mutation_id TEXT,
      user_id TEXT REFERENCES users (id),
      at TEXT NOT NULL,
      action TEXT NOT NULL,
      before TEXT NOT NULL,
      changes TEXT NOT NULL,
      UNIQUE (problem_id, version)
    )`);
    for (const change of ['UPDATE', 'DELETE']) {
      await run(`CREATE TRIGGER audit_events_no_${change.toLowerCase()} BEFORE ${change} ON audit_events
        BEGIN SELECT RAISE(ABORT, 'audit events are never altered'); END`);
    }
  },
  async down(run) {
    await run('DROP TABLE audit_events');
  },
};
