import type { Migration } from '../migration.ts';

export const leaks: Migration = {
  name: '0008-leaks',
  async up(run) {
    await run(`CREATE TABLE leak_answers (
      problem_id TEXT NOT NULL REFERENCES problems (id) ON DELETE CASCADE,
      leak TEXT NOT NULL,
      text TEXT NOT NULL,
      by TEXT NOT NULL,
      user_id TEXT NOT NULL REFERENCES users (id),
      at TEXT NOT NULL,
      basis TEXT NOT NULL,
      PRIMARY KEY (problem_id, leak)
    )`);
    // What was ever found, so that a leak which is found no more can be shown as mended.
    await run(`CREATE TABLE leak_marks (
      problem_id TEXT NOT NULL REFERENCES problems (id) ON DELETE CASCADE,
      leak TEXT NOT NULL,
      name TEXT NOT NULL,
      section TEXT NOT NULL,
      question TEXT NOT NULL,
      evidence TEXT NOT NULL,
      PRIMARY KEY (problem_id, leak)
    )`);
  },
  async down(run) {
    for (const table of ['leak_marks', 'leak_answers']) await run(`DROP TABLE ${table}`);
  },
};
