import type { Migration } from '../migration.ts';

const DEFINITIONS = ['instruments', 'quantities', 'series', 'models', 'comparisons', 'claims', 'charts'];

export const problems: Migration = {
  name: '0002-problems',
  async up(run) {
    await run(`CREATE TABLE problems (
      id TEXT PRIMARY KEY,
      team_id TEXT NOT NULL REFERENCES teams (id) ON DELETE CASCADE,
      number INTEGER NOT NULL CHECK (number > 0),
      title TEXT NOT NULL,
      statement TEXT NOT NULL,
      owners TEXT NOT NULL,
      settings TEXT NOT NULL,
      row_version INTEGER NOT NULL DEFAULT 1,
      evidence_version INTEGER NOT NULL DEFAULT 0,
      created_at TEXT NOT NULL,
      UNIQUE (team_id, number)
    )`);
    await run(`CREATE TABLE tasks (
      problem_id TEXT NOT NULL REFERENCES problems (id) ON DELETE CASCADE,
      id TEXT NOT NULL,
      position INTEGER NOT NULL,
      text TEXT NOT NULL,
      PRIMARY KEY (problem_id, id)
    )`);
    for (const table of DEFINITIONS) {
      await run(`CREATE TABLE ${table} (
        problem_id TEXT NOT NULL REFERENCES problems (id) ON DELETE CASCADE,
        id TEXT NOT NULL,
        position INTEGER NOT NULL,
        content TEXT NOT NULL,
        row_version INTEGER NOT NULL DEFAULT 1,
        removed_at TEXT,
        PRIMARY KEY (problem_id, id),
        UNIQUE (problem_id, position)
      )`);
    }
    await run(`CREATE TABLE trials (
      problem_id TEXT NOT NULL,
      id TEXT NOT NULL,
      series_id TEXT NOT NULL,
      number INTEGER NOT NULL,
      run_order INTEGER NOT NULL,
      user_id TEXT NOT NULL REFERENCES users (id),
      "by" TEXT NOT NULL,
      at TEXT NOT NULL,
      "values" TEXT NOT NULL,
      note TEXT,
      excluded TEXT,
      withdrawn TEXT,
      logged_version INTEGER NOT NULL,
      PRIMARY KEY (problem_id, id),
      UNIQUE (problem_id, series_id, number),
      UNIQUE (problem_id, run_order),
      FOREIGN KEY (problem_id, series_id) REFERENCES series (problem_id, id)
    )`);
  },
  async down(run) {
    for (const table of ['trials', ...[...DEFINITIONS].reverse(), 'tasks', 'problems']) {
      await run(`DROP TABLE ${table}`);
    }
  },
};
